/** A column of a dBASE table: text (C) or number (N), with the width in characters. */
export interface DbfField<Row> {
  name: string;
  type: 'C' | 'N';
  width: number;
  decimals: number;
  value: (row: Row) => string | number;
}

const HEADER_BYTES = 32;
/** A fixed date, so that the same city gives the same bytes: 5 January 2026, the year since 1900. */
const UPDATED_ON = [126, 1, 5] as const;

function fieldText<Row>(field: DbfField<Row>, row: Row): string {
  const value = field.value(row);
  const text = typeof value === 'number' ? value.toFixed(field.decimals) : value;
  if (text.length > field.width) throw new Error(`${text} is too long for ${field.name}.`);
  return field.type === 'N' ? text.padStart(field.width) : text.padEnd(field.width);
}

const ascii = (text: string): number[] => Array.from(text, (letter) => letter.charCodeAt(0) & 0x7f);

/**
 * A table in the dBASE III form that a Shapefile carries its attributes in: a header, a descriptor of
 * 32 bytes a field, a terminator, then rows of fixed width.
 */
export function dbfBytes<Row>(
  fields: readonly DbfField<Row>[],
  rows: readonly Row[],
): Uint8Array<ArrayBuffer> {
  const headerBytes = HEADER_BYTES * (fields.length + 1) + 1;
  const rowBytes = 1 + fields.reduce((sum, field) => sum + field.width, 0);
  const bytes = new Uint8Array(headerBytes + rowBytes * rows.length + 1);
  const view = new DataView(bytes.buffer);
  bytes.set([0x03, ...UPDATED_ON]);
  view.setUint32(4, rows.length, true);
  view.setUint16(8, headerBytes, true);
  view.setUint16(10, rowBytes, true);
  fields.forEach((field, index) => {
    const at = HEADER_BYTES * (index + 1);
    bytes.set(ascii(field.name), at);
    bytes.set(ascii(field.type), at + 11);
    bytes.set([field.width, field.decimals], at + 16);
  });
  bytes[headerBytes - 1] = 0x0d;
  rows.forEach((row, index) => {
    const text = ` ${fields.map((field) => fieldText(field, row)).join('')}`;
    bytes.set(ascii(text), headerBytes + rowBytes * index);
  });
  bytes[bytes.length - 1] = 0x1a;
  return bytes;
}
