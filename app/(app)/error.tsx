'use client'
import { Fault } from '@/components/shell/Fault'

export default Fault
