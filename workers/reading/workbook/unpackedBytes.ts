/** Signatures and offsets of a ZIP's directory: PKWARE APPNOTE 6.3.10, §§ 4.3.12, 4.3.14, 4.3.16, 4.5.3. */
const END = 0x06054b50;
const END_LENGTH = 22;
const ENTRY = 0x02014b50;
const ENTRY_LENGTH = 46;
const LONGEST_REMARK = 0xffff;
const WIDE = 0xffffffff;
const WIDE_FIELD = 1;

/** Where the record of the end of the directory stands; −1 where there is none. */
function findEnd(view: DataView): number {
  const last = view.byteLength - END_LENGTH;
  for (let at = last; at >= 0 && at >= last - LONGEST_REMARK; at--) if (view.getUint32(at, true) === END) return at;
  return -1;
}

/** The unpacked size in the ZIP64 field of an entry, NaN where it is not there. */
function wideSize(view: DataView, from: number, to: number): number {
  for (let at = from; at + 4 <= to; at += 4 + view.getUint16(at + 2, true))
    if (view.getUint16(at, true) === WIDE_FIELD && at + 12 <= to) return Number(view.getBigUint64(at + 4, true));
  return NaN;
}

/**
 * Bytes that a ZIP archive would take unpacked, by its directory, without unpacking anything.
 *
 * @param bytes the whole archive
 * @returns the sum over all entries; NaN where there is no directory, or a damaged one
 */
export function unpackedBytes(bytes: ArrayBuffer): number {
  const view = new DataView(bytes);
  const end = findEnd(view);
  if (end < 0) return NaN;
  const count = view.getUint16(end + 10, true);
  let at = view.getUint32(end + 16, true);
  let sum = 0;
  for (let i = 0; i < count; i++) {
    if (at + ENTRY_LENGTH > view.byteLength || view.getUint32(at, true) !== ENTRY) return NaN;
    const extra = at + ENTRY_LENGTH + view.getUint16(at + 28, true);
    const behind = extra + view.getUint16(at + 30, true);
    const next = behind + view.getUint16(at + 32, true);
    if (next > view.byteLength) return NaN;
    const size = view.getUint32(at + 24, true);
    sum += size === WIDE ? wideSize(view, extra, behind) : size;
    at = next;
  }
  return sum;
}
