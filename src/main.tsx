import { QueryClientProvider } from '@tanstack/react-query'
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { createBrowserRouter, RouterProvider } from 'react-router-dom'
import './styles/app.css'
import { applyTheme, rememberedTheme } from './hooks/theme.ts'
import { createQueryClient } from './lib/query.ts'
import { createRoutes } from './routes.tsx'

const root = document.getElementById('root')
if (!root) throw new Error('index.html has no #root')

applyTheme(rememberedTheme())
const client = createQueryClient()
const router = createBrowserRouter(createRoutes(client))

createRoot(root).render(
  <StrictMode>
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>
  </StrictMode>,
)
