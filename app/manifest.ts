import type { MetadataRoute } from 'next'
import { tokens } from '@/components/ui/tokens'

export default function manifest(): MetadataRoute.Manifest {
  return {
    name: 'Hoopwright',
    short_name: 'Hoopwright',
    description: 'Kit, plot, advance and tuned drums for a touring party.',
    start_url: '/',
    display: 'standalone',
    background_color: tokens.paper.paper,
    theme_color: tokens.paper.paper,
    icons: [{ src: '/icon.svg', sizes: 'any', type: 'image/svg+xml' }],
  }
}
