// @ts-check

/** @param {number} milliseconds @returns {Promise<void>} */
export const pause = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds))
