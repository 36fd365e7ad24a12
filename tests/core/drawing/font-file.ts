/** Advance widths in ems by character, read from a TrueType file's own tables (OpenType specification: cmap 4, hmtx). */
export function advanceWidths(file: Buffer): Map<number, number> {
  const table = (tag: string): number => {
    for (let i = 0; i < file.readUInt16BE(4); i++) {
      const record = 12 + 16 * i;
      if (file.toString('latin1', record, record + 4) === tag) return file.readUInt32BE(record + 8);
    }
    throw new Error(`no ${tag} table`);
  };
  const em = file.readUInt16BE(table('head') + 18);
  const metrics = file.readUInt16BE(table('hhea') + 34);
  const hmtx = table('hmtx');
  const advance = (glyph: number): number => file.readUInt16BE(hmtx + 4 * Math.min(glyph, metrics - 1)) / em;

  const cmap = table('cmap');
  const widths = new Map<number, number>();
  for (let i = 0; i < file.readUInt16BE(cmap + 2); i++) {
    const sub = cmap + file.readUInt32BE(cmap + 4 + 8 * i + 4);
    if (file.readUInt16BE(sub) !== 4) continue;
    const segments = file.readUInt16BE(sub + 6) / 2;
    for (let s = 0; s < segments; s++) {
      const at = (list: number): number => sub + 14 + 2 * s + list;
      const end = file.readUInt16BE(at(0));
      const start = file.readUInt16BE(at(2 * segments + 2));
      const delta = file.readUInt16BE(at(4 * segments + 2));
      const rangeAt = at(6 * segments + 2);
      const range = file.readUInt16BE(rangeAt);
      for (let code = start; code <= end && code < 0xffff; code++) {
        const raw = range === 0 ? code : file.readUInt16BE(rangeAt + range + 2 * (code - start));
        const glyph = raw === 0 ? 0 : (raw + delta) & 0xffff;
        if (glyph !== 0) widths.set(code, advance(glyph));
      }
    }
  }
  return widths;
}
