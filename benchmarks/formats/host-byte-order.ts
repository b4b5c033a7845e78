/** The byte order of the machine that the code runs on. */

/**
 * True where typed arrays hold their least significant byte first, as on all common machines.
 *
 * @example if (isHostLittleEndian) values = new Float64Array(bytes.buffer)
 */
export const isHostLittleEndian = new Uint8Array(Uint32Array.of(1).buffer)[0] === 1;
