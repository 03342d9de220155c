import { bytesToText } from './names'

/** Label of the decoder for each code page name that $DWGCODEPAGE uses; DOS pages that no decoder knows are read as windows-1252. */
const DECODERS: Record<string, string> = {
  ASCII: 'windows-1252',
  'ISO8859-1': 'windows-1252',
  'UTF-8': 'utf-8',
  UTF8: 'utf-8',
  ANSI_874: 'windows-874',
  ANSI_932: 'shift_jis',
  ANSI_936: 'gbk',
  ANSI_949: 'euc-kr',
  ANSI_950: 'big5',
  ANSI_1361: 'euc-kr',
  GB2312: 'gbk',
  BIG5: 'big5',
  KSC5601: 'euc-kr',
  DOS866: 'ibm866',
  DOS932: 'shift_jis',
  MACINTOSH: 'macintosh',
  MAC_ROMAN: 'macintosh',
  ...Object.fromEntries(
    ['1250', '1251', '1252', '1253', '1254', '1255', '1256', '1257', '1258'].map((n) => [`ANSI_${n}`, `windows-${n}`]),
  ),
}
/** Upper halves of the DOS pages of western drawings. */
const DOS_UPPER: Record<string, string> = {
  DOS437:
    'ÇüéâäàåçêëèïîìÄÅÉæÆôöòûùÿÖÜ¢£¥₧ƒáíóúñÑªº¿⌐¬½¼¡«»░▒▓│┤╡╢╖╕╣║╗╝╜╛┐└┴┬├─┼╞╟╚╔╩╦╠═╬╧╨╤╥╙╘╒╓╫╪┘┌█▄▌▐▀αßΓπΣσµτΦΘΩδ∞φε∩≡±≥≤⌠⌡÷≈°∙·√ⁿ²■\u00a0',
  DOS850:
    'ÇüéâäàåçêëèïîìÄÅÉæÆôöòûùÿÖÜø£Ø×ƒáíóúñÑªº¿®¬½¼¡«»░▒▓│┤ÁÂÀ©╣║╗╝¢¥┐└┴┬├─┼ãÃ╚╔╩╦╠═╬¤ðÐÊËÈıÍÎÏ┘┌█▄¦Ì▀ÓßÔÒõÕµþÞÚÛÙýÝ¯´\u00ad±‗¾¶§÷¸°¨·¹³²■\u00a0',
}
/** Code pages of \M+n, by n. */
const MULTI_BYTE: Record<string, string> = { 1: 'shift_jis', 2: 'big5', 3: 'euc-kr', 4: 'euc-kr', 5: 'gbk' }

/** Turns the bytes of names and texts into text. */
export interface TextReader {
  known: boolean
  read: (raw: string) => string
}

/**
 * How the texts of a file are decoded: UTF-8 from AC1021 on or after a byte-order mark (windows-1252 where
 * the bytes are no UTF-8), before that the code page that the file names. \U+xxxx and \M+nxxxx always count.
 * Texts come as one character a byte.
 */
export function textReader(version: string, codePage: string, marked: boolean): TextReader {
  const page = codePage.trim().toUpperCase()
  const upper = DOS_UPPER[page]
  const unicode = marked || version >= 'AC1021'
  const label = unicode ? 'utf-8' : DECODERS[page]
  const decode = upper && !unicode ? (raw: string) => throughTable(raw, upper) : throughDecoder(label ?? 'windows-1252')
  return {
    known: unicode || page === '' || label !== undefined || upper !== undefined,
    read: (raw) => decodeEscapes(decode(raw)),
  }
}

const throughTable = (raw: string, upper: string): string => {
  let text = ''
  for (let i = 0; i < raw.length; i++) text += raw.charCodeAt(i) < 128 ? raw[i] : upper[raw.charCodeAt(i) - 128]
  return text
}

function throughDecoder(label: string): (raw: string) => string {
  const decoder = new TextDecoder(label, { fatal: label === 'utf-8' })
  const western = new TextDecoder('windows-1252')
  return (raw) => {
    if (isAscii(raw)) return raw
    const bytes = Uint8Array.from(raw, (c) => c.charCodeAt(0))
    try {
      return decoder.decode(bytes)
    } catch {
      return western.decode(bytes)
    }
  }
}

function isAscii(raw: string): boolean {
  for (let i = 0; i < raw.length; i++) if (raw.charCodeAt(i) > 127) return false
  return true
}

function decodeEscapes(text: string): string {
  if (!text.includes('\\')) return text
  return text
    .replace(/\\U\+([0-9A-Fa-f]{4})/g, (_, hex: string) => String.fromCharCode(Number.parseInt(hex, 16)))
    .replace(/\\M\+([1-5])([0-9A-Fa-f]{2})([0-9A-Fa-f]{2})/g, (_, page: string, high: string, low: string) =>
      new TextDecoder(MULTI_BYTE[page]).decode(Uint8Array.of(Number.parseInt(high, 16), Number.parseInt(low, 16))),
    )
}

/** The value of a group as text of one character a byte, without outer blanks. */
export const rawText = (bytes: Uint8Array, from: number, to: number): string => bytesToText(bytes, from, to).trim()
