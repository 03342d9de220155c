import type { MaterialFields } from '@/lib/api/schemas/people'

/** Materials that every new team starts with: density in kg/m³ and where it stands. */
export const USUAL_MATERIALS: readonly MaterialFields[] = [
  { name: 'Aluminium EN AW-6060', density: 2700, source: 'EN 1999-1-1, 3.2.5' },
  { name: 'Aluminium EN AW-6061', density: 2700, source: 'EN 1999-1-1, 3.2.5' },
  { name: 'Aluminium EN AW-6063', density: 2700, source: 'EN 1999-1-1, 3.2.5' },
  { name: 'Aluminium EN AW-6082', density: 2700, source: 'EN 1999-1-1, 3.2.5' },
  { name: 'Steel S235', density: 7850, source: 'EN 1991-1-1, table A.4' },
  { name: 'Steel S275', density: 7850, source: 'EN 1991-1-1, table A.4' },
  { name: 'Steel S355', density: 7850, source: 'EN 1991-1-1, table A.4' },
  { name: 'Steel ASTM A36', density: 7849.05, source: '490 lb/ft³, common practice' },
  { name: 'Steel ASTM A992', density: 7849.05, source: '490 lb/ft³, common practice' },
  { name: 'Stainless steel 1.4301', density: 7900, source: 'EN 10088-1' },
  { name: 'PA66 GF25', density: 1325, source: 'middle of 1300 to 1350; take it from the strip’s certificate' },
]
