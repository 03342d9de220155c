'use client'
import { Menu, type MenuItem } from '@/components/ui/Menu'
import type { TeamSettings } from '@/lib/api/schemas/people'

const UNITS: [TeamSettings['lengthUnit'], string][] = [
  ['mm', 'mm for everything'],
  ['cm', 'mm, but areas and moduli in cm'],
  ['in', 'inch and pound'],
]
const SYMBOLS: [TeamSettings['symbols'], string][] = [
  ['en', 'EN symbols: Wel, Wpl'],
  ['us', 'US symbols: S, Z'],
]
const AXES: [TeamSettings['axes'], string][] = [
  ['xy', 'Axes x–y, principal 1–2'],
  ['yz', 'Axes y–z, principal u–v'],
]

/** Units, symbols and axis names of this page; the team's own settings stay as they are. */
export function DisplaySwitch({ display, onChange }: { display: TeamSettings; onChange: (next: TeamSettings) => void }) {
  const items: (MenuItem | 'line')[] = [
    ...UNITS.map(([lengthUnit, label]) => ({
      label,
      checked: display.lengthUnit === lengthUnit,
      onChoose: () => onChange({ ...display, lengthUnit }),
    })),
    'line',
    ...SYMBOLS.map(([symbols, label]) => ({
      label,
      checked: display.symbols === symbols,
      onChoose: () => onChange({ ...display, symbols }),
    })),
    'line',
    ...AXES.map(([axes, label]) => ({ label, checked: display.axes === axes, onChoose: () => onChange({ ...display, axes }) })),
  ]
  const words = `${display.lengthUnit} · ${display.digits} digits · ${display.symbols === 'en' ? 'EN' : 'US'}`
  const label = <span className="text-small text-soft">{words} ▾</span>
  return <Menu label={label} name={`Units, symbols and axis names: ${words}`} items={items} />
}
