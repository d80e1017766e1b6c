export const defaultPort = 4173;

/**
 * The port asked for in the environment.
 *
 * @param {string | undefined} text - A whole number from 0 (any free port) to 65535; missing or empty means the default.
 * @returns {number | undefined} Nothing if the text is no port.
 */
export function portFrom(text) {
  if (text === undefined || text === "") return defaultPort;
  return /^\d{1,5}$/.test(text) && Number(text) <= 65535 ? Number(text) : undefined;
}
