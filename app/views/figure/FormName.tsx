import type { RichText } from '../../figures/richText.ts';

/** A formula with its sub- and superscripts. */
export function FormName({ label }: { readonly label: RichText }) {
  return label.map(({ text, at }) => {
    const key = `${at} ${text}`;
    if (at === 'sub') return <sub key={key}>{text}</sub>;
    return at === 'sup' ? <sup key={key}>{text}</sup> : <span key={key}>{text}</span>;
  });
}
