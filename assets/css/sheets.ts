/** The colour tokens of the three sheets: one table, read by Tailwind's configuration and by the contrast test. */
export const SHEETS = {
  light: {
    'paper': '#FAF8F3', 'sheet': '#FFFFFF', 'ink': '#16232B', 'ink-2': '#4A5A63', 'rule': '#D8D2C4', 'margin': '#B5483A',
    'act': '#0F5C5C', 'on-act': '#FFFFFF', 'query': '#8A5A00', 'stop': '#A3211B', 'good': '#2F6B3A',
  },
  dark: {
    'paper': '#10171B', 'sheet': '#162025', 'ink': '#EAE5D8', 'ink-2': '#A8B4B8', 'rule': '#33424A', 'margin': '#C4685A',
    'act': '#72C6C0', 'on-act': '#0E1619', 'query': '#E4B455', 'stop': '#FF9D90', 'good': '#8FCE9A',
  },
  sun: {
    'paper': '#FFFFFF', 'sheet': '#FFFFFF', 'ink': '#000000', 'ink-2': '#1F292F', 'rule': '#5C5C5C', 'margin': '#8E1B10',
    'act': '#00403F', 'on-act': '#FFFFFF', 'query': '#553500', 'stop': '#7A0C08', 'good': '#0B4519',
  },
} as const

export type SheetName = keyof typeof SHEETS
export type Token = keyof typeof SHEETS['light']

/** The tokens of one sheet as CSS custom properties. */
export function properties(sheet: SheetName): Record<string, string> {
  const colours = Object.fromEntries(Object.entries(SHEETS[sheet]).map(([name, value]) => [`--${name}`, value]))
  // A hairline that sunlight does not wash out is a little more than a hairline.
  return { ...colours, '--hair': sheet === 'sun' ? '2px' : '1px', 'color-scheme': sheet === 'dark' ? 'dark' : 'light' }
}
