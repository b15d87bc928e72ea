import { type Figure, figure } from './figure'
import { newestBuild, pageScripts } from './page-scripts'

/** Compressed script of the first page that anybody sees and of the heaviest; nothing where the application was not built. */
export const benchPages = (root: string): Figure[] => {
  const build = newestBuild(root)
  const pages = build === null ? [] : pageScripts(build)
  const first = pages.find(({ page }) => page.endsWith('/sign-in'))
  const heaviest = [...pages].sort((a, b) => b.bytes - a.bytes)[0]
  return [
    ...(first ? [figure(`page ${first.page}: script, compressed`, first.bytes / 1000, 'kB')] : []),
    ...(heaviest ? [figure('heaviest page: script, compressed', heaviest.bytes / 1000, 'kB')] : []),
  ]
}
