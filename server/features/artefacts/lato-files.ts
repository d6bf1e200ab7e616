import { createRequire } from 'node:module'
import type { TextMark } from '@shared/symbols/display-list'

const require = createRequire(import.meta.url)

/** Font files of the printed page (Lato, SIL Open Font License), by weight. */
export const latoFiles: Record<TextMark['weight'], string> = {
  400: require.resolve('@expo-google-fonts/lato/400Regular/Lato_400Regular.ttf'),
  700: require.resolve('@expo-google-fonts/lato/700Bold/Lato_700Bold.ttf'),
  900: require.resolve('@expo-google-fonts/lato/900Black/Lato_900Black.ttf'),
}

/** Letters of western Europe, and those of Poland beside them: the two files that Lato's web fonts come in. The second
 *  takes what the first does not have. */
const subsets = [
  { name: 'latin-ext', range: 'U+100-2AF,U+1E00-1EFF' },
  { name: 'latin', range: 'U+0-FF,U+131,U+152-153,U+2C6,U+2DA,U+2DC,U+2000-206F,U+20AC,U+2122,U+2212' },
] as const

const webFiles = (weight: number): { path: string; range: string }[] =>
  subsets.map(({ name, range }) => ({
    path: require.resolve(`@fontsource/lato/files/lato-${name}-${weight}-normal.woff2`),
    range,
  }))

/** Web fonts of the same drawing, for a picture that must carry its letters with it. */
export const latoWebFiles: Record<TextMark['weight'], readonly { path: string; range: string }[]> = {
  400: webFiles(400),
  700: webFiles(700),
  900: webFiles(900),
}
