import { DXF_UNITS } from '../units'
import { GroupWriter } from './groupWriter'

const OUTER_COLOUR = 7
const HOLES_COLOUR = 5

/** The rest of an R2000 document around its entities: the least that strict readers ask for. */
export function documentAround(entities: GroupWriter, unit: string): string {
  const metric = unit !== 'in' && unit !== 'ft'
  const units = Math.max(
    0,
    DXF_UNITS.findIndex(({ name }) => name === unit),
  )
  const w = new GroupWriter()
  section(w, 'HEADER')
  w.put(9, '$ACADVER').put(1, 'AC1015').put(9, '$DWGCODEPAGE').put(3, 'ANSI_1252')
  w.put(9, '$INSUNITS')
    .put(70, units)
    .put(9, '$MEASUREMENT')
    .put(70, metric ? 1 : 0)
  w.put(9, '$HANDSEED').put(5, entities.handle.toString(16).toUpperCase()).put(0, 'ENDSEC')
  section(w, 'TABLES')
  table(w, 'VPORT', '8', [])
  table(w, 'LTYPE', '5', ['14 ByBlock', '15 ByLayer', '16 Continuous'], (row) => {
    row.put(70, 0).put(3, '').put(72, 65).put(73, 0).real(40, 0)
  })
  table(w, 'LAYER', '2', ['10 0', '18 OUTER', '19 HOLES'], (row, name) => {
    const colour = name === 'HOLES' ? HOLES_COLOUR : OUTER_COLOUR
    row.put(70, 0).put(62, colour).put(6, 'Continuous')
  })
  table(w, 'STYLE', '3', ['11 Standard'], (row) => {
    row.put(70, 0).real(40, 0).real(41, 1).real(50, 0).put(71, 0).real(42, 2.5).put(3, 'txt').put(4, '')
  })
  table(w, 'VIEW', '6', [])
  table(w, 'UCS', '7', [])
  table(w, 'APPID', '9', ['12 ACAD'], (row) => {
    row.put(70, 0)
  })
  table(w, 'DIMSTYLE', 'A', [])
  table(w, 'BLOCK_RECORD', '1', ['1F *Model_Space', '1B *Paper_Space'])
  w.put(0, 'ENDSEC')
  section(w, 'BLOCKS')
  block(w, '*Model_Space', '1F', '20', '21')
  block(w, '*Paper_Space', '1B', '1C', '1D')
  w.put(0, 'ENDSEC')
  section(w, 'ENTITIES')
  const after = new GroupWriter()
  after.put(0, 'ENDSEC')
  section(after, 'OBJECTS')
  after.put(0, 'DICTIONARY').put(5, 'C').put(330, '0').put(100, 'AcDbDictionary').put(281, 1).put(3, 'ACAD_GROUP').put(350, 'D')
  after.put(0, 'DICTIONARY').put(5, 'D').put(330, 'C').put(100, 'AcDbDictionary').put(281, 1)
  after.put(0, 'ENDSEC').put(0, 'EOF')
  return w.text() + entities.text() + after.text()
}

const section = (w: GroupWriter, name: string): GroupWriter => w.put(0, 'SECTION').put(2, name)

const RECORD_CLASS: Record<string, string> = {
  LTYPE: 'AcDbLinetypeTableRecord',
  LAYER: 'AcDbLayerTableRecord',
  STYLE: 'AcDbTextStyleTableRecord',
  APPID: 'AcDbRegAppTableRecord',
  BLOCK_RECORD: 'AcDbBlockTableRecord',
}

/** A table with its rows, each given as its handle and name. */
function table(
  w: GroupWriter,
  kind: string,
  handle: string,
  rows: readonly string[],
  fill: (row: GroupWriter, name: string) => void = () => {},
): void {
  w.put(0, 'TABLE').put(2, kind).put(5, handle).put(330, '0').put(100, 'AcDbSymbolTable').put(70, rows.length)
  if (kind === 'DIMSTYLE') w.put(100, 'AcDbDimStyleTable')
  for (const row of rows) {
    const [own, name] = row.split(' ')
    w.put(0, kind).put(5, own).put(330, handle).put(100, 'AcDbSymbolTableRecord').put(100, RECORD_CLASS[kind]).put(2, name)
    fill(w, name)
  }
  w.put(0, 'ENDTAB')
}

function block(w: GroupWriter, name: string, record: string, begin: string, end: string): void {
  w.put(0, 'BLOCK').put(5, begin).put(330, record).put(100, 'AcDbEntity').put(8, '0').put(100, 'AcDbBlockBegin')
  w.put(2, name).put(70, 0).point(10, 0, 0).put(3, name).put(1, '')
  w.put(0, 'ENDBLK').put(5, end).put(330, record).put(100, 'AcDbEntity').put(8, '0').put(100, 'AcDbBlockEnd')
}
