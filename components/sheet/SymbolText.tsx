import type { FigureSymbol } from '@/lib/section/figures/figure'

/** A symbol with its subscript lowered. */
export function SymbolText({ symbol }: { symbol: FigureSymbol }) {
  return (
    <>
      {symbol.base}
      {symbol.sub && <sub>{symbol.sub}</sub>}
    </>
  )
}
