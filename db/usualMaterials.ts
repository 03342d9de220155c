import type { MaterialFields } from '@/lib/api/schemas/people'

/** Materials that every new team starts with: density in kg/m³ and where it stands. */
export const USUAL_MATERIALS: readonly MaterialFields[] = [
  { name: 'EN AW-6060 T66', density: 2700, source: 'EN 1999-1-1, 3.2.5' },
  { name: 'EN AW-6061 T6', density: 2700, source: 'EN 1999-1-1, 3.2.5' },
  { name: 'EN AW-6063 T5', density: 2700, source: 'EN 1999-1-1, 3.2.5' },
  { name: 'EN AW-6063 T6', density: 2700, source: 'EN 1999-1-1, 3.2.5' },
  { name: 'EN AW-6082 T6', density: 2700, source: 'EN 1999-1-1, 3.2.5' },
  { name: 'S235', density: 7850, source: 'EN 1993-1-1, from memory' },
  { name: 'S275', density: 7850, source: 'EN 1993-1-1, from memory' },
  { name: 'S355', density: 7850, source: 'EN 1993-1-1, from memory' },
  { name: 'ASTM A36', density: 7849.05, source: '490 lb/ft³, common practice, no source' },
  { name: 'ASTM A992', density: 7849.05, source: '490 lb/ft³, common practice, no source' },
  { name: 'Stainless steel 1.4301', density: 7900, source: 'EN 10088, from memory' },
  { name: 'PA66 GF25', density: 1325, source: 'middle of 1300 to 1350; take it from the strip’s certificate' },
]
