/** The one source of colours, type and corners. CSS variables (`apply-theme.ts`) and Ant Design Vue's tokens
 *  (`ant-theme.ts`) are made from it. */
export interface Palette {
  /** Behind the page. */
  desk: string
  /** Bar, rail, slips, foot. */
  slip: string
  /** The page; it stays paper in the dark. */
  paper: string
  ink: string
  /** Secondary text. */
  quiet: string
  /** Hairlines. */
  rule: string
  /** Accent: the one filled button, what stops a release. */
  oxide: string
  /** Text on a filled button. */
  'on-oxide': string
  /** Links, focus, selection on the map. */
  slate: string
  /** Needs a waiver. */
  ochre: string
  /** Advice. */
  stone: string
  /** Behind light letters: the third ink of people's initials. */
  moss: string
  /** Selected row. */
  wash: string
  /** Ground of an input on a slip. */
  field: string
  /** Edge of an input: at least 3 : 1 on a slip and on paper. */
  'field-edge': string
  /** Row under the pointer on a slip. */
  hover: string
  /** Under the page. */
  shadow: string
}

export type ThemeName = 'light' | 'dark'

export const palettes: Record<ThemeName, Palette> = {
  light: {
    desk: '#dcd5c7',
    slip: '#f6f1e6',
    paper: '#fdfaf3',
    ink: '#1f1b16',
    quiet: '#6b6357',
    rule: '#cfc6b4',
    oxide: '#a8321c',
    'on-oxide': '#fdfaf3',
    slate: '#2f5574',
    ochre: '#c98a1b',
    stone: '#8b8474',
    moss: '#5d7a3a',
    wash: '#efe6d3',
    field: '#fdfaf3',
    'field-edge': '#8b8474',
    hover: '#ece4d3',
    shadow: '0 1px 2px rgb(60 45 25 / 25%), 0 12px 30px rgb(60 45 25 / 16%)',
  },
  dark: {
    desk: '#1b1a18',
    slip: '#242220',
    paper: '#fdfaf3',
    ink: '#efe8db',
    quiet: '#a59b8b',
    rule: '#3a3733',
    oxide: '#e0674c',
    'on-oxide': '#1b1a18',
    slate: '#8fb4d1',
    ochre: '#c98a1b',
    stone: '#8b8474',
    moss: '#5d7a3a',
    wash: '#efe6d3',
    field: '#1b1a18',
    'field-edge': '#857d70',
    hover: '#322f2b',
    shadow: '0 1px 2px rgb(0 0 0 / 45%), 0 12px 30px rgb(0 0 0 / 40%)',
  },
}

/** Colours of things that lie on paper, which never turns dark. */
export const onPaper = {
  'ink-on-paper': palettes.light.ink,
  'quiet-on-paper': palettes.light.quiet,
  'rule-on-paper': palettes.light.rule,
  'oxide-on-paper': palettes.light.oxide,
  'slate-on-paper': palettes.light.slate,
  'wash-oxide': '#f3dcd3',
} as const

export const FONT_FAMILY = "Lato, 'Helvetica Neue', Arial, sans-serif"

/** Pixels. */
export const type = {
  capitals: 10.5,
  dense: 12.5,
  body: 13,
  slipTitle: 15,
  sheetTitle: 21,
  pageTitle: 30,
} as const
/** Pixels. */
export const CORNER = 2
