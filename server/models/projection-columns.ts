import { DataTypes } from 'sequelize'

/** What lists and the look-up search of a revision or coupon; see services/projections.ts. Sizes in mm. */
export interface Projections {
  title: string
  processes: string[]
  metals: string[]
  metalsLabel: string
  positions: string[]
  standards: string[]
  weld: string
  thicknessMin: number | null
  thicknessMax: number | null
  diameterMin: number | null
  diameterMax: number | null
}

const texts = () => DataTypes.ARRAY(DataTypes.TEXT)

export const projectionColumns = () => ({
  title: DataTypes.TEXT,
  processes: texts(),
  metals: texts(),
  metalsLabel: DataTypes.TEXT,
  positions: texts(),
  standards: texts(),
  weld: DataTypes.TEXT,
  thicknessMin: DataTypes.DOUBLE,
  thicknessMax: DataTypes.DOUBLE,
  diameterMin: DataTypes.DOUBLE,
  diameterMax: DataTypes.DOUBLE,
})
