/** The largest file that is checked, octets. */
export const uploadLimit = 20 * 2 ** 20

export const tooLarge = 'The file is larger than 20 MB: no report is. Choose the report itself.'
