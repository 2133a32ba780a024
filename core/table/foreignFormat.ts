const SIGNATURES: readonly (readonly [signature: readonly number[], name: string, remedy: string])[] = [
  [[0x89, 0x50, 0x4e, 0x47], 'a PNG picture', 'Export the curve as text, not as a picture.'],
  [[0xff, 0xd8, 0xff], 'a JPEG picture', 'Export the curve as text, not as a picture.'],
  [[0x47, 0x49, 0x46, 0x38], 'a GIF picture', 'Export the curve as text, not as a picture.'],
  [[0x42, 0x4d], 'a BMP picture', 'Export the curve as text, not as a picture.'],
  [[0x25, 0x50, 0x44, 0x46], 'a PDF document', 'Export the data points as text (CSV), not as a printed report.'],
  [[0x50, 0x4b, 0x03, 0x04], 'a ZIP archive or a spreadsheet workbook', 'Save the sheet with the data points as CSV.'],
  [[0xd0, 0xcf, 0x11, 0xe0], 'an old spreadsheet or office document', 'Save the sheet with the data points as CSV.'],
  [[0x1f, 0x8b], 'a gzip archive', 'Unpack it and drop the text file inside.'],
];

/** What a file that is not text seems to be, from its first bytes; undefined where nothing known begins so. */
export function foreignFormat(bytes: Uint8Array): { readonly name: string; readonly remedy: string } | undefined {
  for (const [signature, name, remedy] of SIGNATURES) {
    if (bytes.length >= signature.length && signature.every((byte, index) => bytes[index] === byte)) {
      return { name, remedy };
    }
  }
  return undefined;
}
