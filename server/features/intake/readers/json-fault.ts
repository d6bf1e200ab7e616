/** What may come next while reading JSON. */
type Expected = 'value' | 'value-or-end' | 'key' | 'key-or-end' | 'colon' | 'next'

const blanks = /[\t\n\r ]*/y
const key = /"(?:[^"\\\u0000-\u001f]|\\["\\/bfnrt]|\\u[0-9a-fA-F]{4})*"/y
const scalar = new RegExp(
  `${key.source}|-?(?:0|[1-9]\\d*)(?:\\.\\d+)?(?:[eE][+-]?\\d+)?|true|false|null`,
  'y',
)

/** Offset at which a text stops being JSON; its length if it breaks off; undefined if it is JSON. JSON.parse reads the
 *  file; this only finds the place, which it does not tell in every case. */
export function findJsonFault(text: string): number | undefined {
  const open: ('array' | 'object')[] = []
  let expected: Expected = 'value'
  let at = 0
  const eat = (pattern: RegExp): boolean => {
    pattern.lastIndex = at
    const matched = pattern.test(text)
    if (matched) at = pattern.lastIndex
    return matched
  }
  for (;;) {
    eat(blanks)
    if (at >= text.length) return expected === 'next' && open.length === 0 ? undefined : at
    const step = nextStep(text[at] ?? '', expected, open)
    if (step) {
      at += 1
      expected = step
    } else if ((expected === 'key' || expected === 'key-or-end') && eat(key)) expected = 'colon'
    else if ((expected === 'value' || expected === 'value-or-end') && eat(scalar)) expected = 'next'
    else return at
  }
}

/** What is expected after a bracket, comma or colon; undefined where the character is none, or may not stand here. */
function nextStep(character: string, expected: Expected, open: ('array' | 'object')[]): Expected | undefined {
  const inside = open.at(-1)
  const takesValue = expected === 'value' || expected === 'value-or-end'
  if (takesValue && (character === '[' || character === '{')) {
    open.push(character === '[' ? 'array' : 'object')
    return character === '[' ? 'value-or-end' : 'key-or-end'
  }
  if (expected === 'colon') return character === ':' ? 'value' : undefined
  if (expected === 'next' && character === ',' && inside) return inside === 'array' ? 'value' : 'key'
  const endsArray =
    character === ']' && inside === 'array' && (expected === 'next' || expected === 'value-or-end')
  const endsObject =
    character === '}' && inside === 'object' && (expected === 'next' || expected === 'key-or-end')
  if (!endsArray && !endsObject) return undefined
  open.pop()
  return 'next'
}
