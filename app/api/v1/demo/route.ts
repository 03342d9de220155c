import { route } from '@/lib/api/route'
import { loadDemo } from '@/lib/jobs/demo'

export const POST = route({ permission: 'demo.load', status: 201 }, ({ actor }) => loadDemo(actor))
