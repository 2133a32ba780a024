/** A header in lower case without accents; the letters that stand for a difference become "d". */
export function plainWords(text: string): string {
  return text
    .normalize('NFD')
    .replace(/[\u0300-\u036f]/g, '')
    .toLowerCase()
    .replace(/[δ∆∂]/g, 'd')
    .replaceAll('_', ' ')
    .trim();
}
