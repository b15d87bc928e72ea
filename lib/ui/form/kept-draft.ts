import type { GroupDraft } from './draft'

/** Unsaved text of one form with the version it was typed over. */
export interface KeptDraft {
  draft: GroupDraft
  /** The record as it was when typing began. */
  base: GroupDraft
  version: number
  /** When it was last typed into, milliseconds. */
  at: number
}

const prefix = 'breakaway.unsaved.'

const isKept = (value: unknown): value is KeptDraft => {
  if (typeof value !== 'object' || value === null) return false
  const { draft, base, version, at } = value as Partial<KeptDraft>
  return typeof version === 'number' && typeof at === 'number' && draft?.is === 'group' && base?.is === 'group'
}

/** Keeps unsaved text in this browser, so that a reload or an ended session loses none. A full or closed store is no error. */
export const keepDraft = (key: string, kept: KeptDraft): void => {
  try {
    localStorage.setItem(prefix + key, JSON.stringify(kept))
  } catch {
    // The text still stands in the form.
  }
}

export const keptDraft = (key: string): KeptDraft | null => {
  try {
    const value: unknown = JSON.parse(localStorage.getItem(prefix + key) ?? 'null')
    return isKept(value) ? value : null
  } catch {
    return null
  }
}

export const forgetDraft = (key: string): void => {
  try {
    localStorage.removeItem(prefix + key)
  } catch {
    // Nothing was kept then.
  }
}
