import { DOMParser, onErrorStopParsing, ParseError, type Document } from '@xmldom/xmldom'
import { unreadable, type Unreadable } from './read-outcome'

/** Reads XML whose first element is `root`. A file that declares a document type or entities is refused before it is
 *  parsed: neither KML nor GPX needs them, and they can be made to swell without end or to reach out.
 *  @param format what a person calls such files: KML */
export function parseXml(
  text: string,
  root: string,
  format: string,
): { outcome: 'xml'; document: Document } | Unreadable {
  // Inside comments and CDATA these are mere text; anywhere else `<!` can only open a declaration.
  const markup = text.replace(/<!--[\s\S]*?-->|<!\[CDATA\[[\s\S]*?\]\]>/g, '')
  if (/<!(DOCTYPE|ENTITY)/i.test(markup)) {
    return unreadable(
      `The file declares a document type or entities of its own. ${format} needs none, and such files are not read.`,
    )
  }
  try {
    const document = new DOMParser({ onError: onErrorStopParsing }).parseFromString(text, 'text/xml')
    const found = document.documentElement?.nodeName ?? ''
    if (found === root) return { outcome: 'xml', document }
    return unreadable(`The file is XML, but not ${format}: its first element is <${found.slice(0, 40)}>.`)
  } catch (cause) {
    if (!(cause instanceof ParseError)) throw cause
    if (!new RegExp(`</${root}\\s*>\\s*$`).test(text.slice(-200)))
      return unreadable(`The file is not whole: it does not end with </${root}>, so it seems to be cut off.`)
    const line = lineOf(cause.locator)
    const place = line > 0 ? ` near line ${line}` : ''
    return unreadable(`The file is not whole XML: its elements do not fit together${place}.`)
  }
}

/** xmldom does not type its locator. */
function lineOf(locator: unknown): number {
  const line =
    typeof locator === 'object' && locator !== null && 'lineNumber' in locator ? locator.lineNumber : 0
  return typeof line === 'number' ? line : 0
}
