/** Where to go after signing in: a page of ours and nowhere else, whatever the address asked for. */
export const whereNext = (asked: string | null): string =>
  asked && /^\/(?![/\\])[\w/?=&.~-]*$/.test(asked) ? asked : '/projects'
