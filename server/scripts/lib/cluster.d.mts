/** Types of `cluster.mjs` for the tests, which start throw-away clusters with it. */
export interface Cluster {
  url(database: string): string
  port: number
  home: string
  stop(mode?: 'fast' | 'immediate'): void
}
export function startCluster(options: {
  programs: string
  dataFolder: string
  durable?: boolean
}): Promise<Cluster>
export function freePort(wanted?: number): Promise<number>
