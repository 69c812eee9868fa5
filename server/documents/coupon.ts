export interface CouponDocument { number: string }
