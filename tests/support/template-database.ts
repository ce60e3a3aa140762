/** The database that every test file gets a copy of. */
export const template = 'crosshead_template'

/** The address of a database on the test server for one of its two users. */
export function urlFor(adminUrl: string, user: 'crosshead_owner' | 'crosshead_app', name: string): string {
  const url = new URL(adminUrl)
  url.username = user
  url.password = 'only-for-tests'
  url.pathname = `/${name}`
  return url.href
}
