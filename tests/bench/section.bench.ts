import { readFileSync } from 'node:fs'
import { selectEdges } from '@/lib/dxf/select'
import { outlinesOf } from '@/lib/geometry/outlines'
