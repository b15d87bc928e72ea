/** What a file may hold before it is refused without being read further. */
export const verificationLimits = {
  /** Size of the file, octets. */
  bytes: 20 * 2 ** 20,
  /** Revisions: the rendered report, three sign-offs, a time stamp, and room. */
  revisions: 16,
  /** Objects listed by all cross-reference tables together. */
  objects: 200_000,
  /** Size of the attached study once unpacked, octets. */
  attachment: 32 * 2 ** 20,
  /** Wall-clock time of a whole check in its thread, milliseconds. */
  milliseconds: 10_000,
  /** Memory of that thread's heap. */
  heapMegabytes: 512,
} as const
