import { createHash } from 'node:crypto';
import type { Plugin } from 'vite';

/** Hash of a style element without text: Plotly makes one and fills it by script. */
const EMPTY_STYLE = sourceHash('');

/**
 * Writes the Content-Security-Policy into the finished page, so that nothing can leave it.
 *
 * @param inlined whether script and styles stand inside the page (then they are allowed by their hashes) or
 *   beside it (then by their origin)
 */
export function contentPolicy(inlined: boolean): Plugin {
  return {
    name: 'content-policy',
    apply: 'build',
    enforce: 'post',
    // Inlining happens in this hook too, so the hashes must be taken after every other plugin.
    generateBundle: {
      order: 'post',
      handler(_options, bundle) {
        for (const file of Object.values(bundle)) {
          if (file.type === 'asset' && file.fileName.endsWith('.html')) {
            file.source = withPolicy(String(file.source), inlined);
          }
        }
      },
    },
  };
}

function withPolicy(page: string, inlined: boolean): string {
  const charset = /<meta charset="[^"]*"\s*\/?>/i;
  if (!charset.test(page)) throw new Error('The page states no character set to put the policy behind.');
  const tag = `<meta http-equiv="Content-Security-Policy" content="${policyOf(page, inlined)}">`;
  // A function, because "$" has a meaning in a replacement text.
  return page.replace(charset, (found) => `${found}\n    ${tag}`);
}

function policyOf(page: string, inlined: boolean): string {
  const scripts: string[] = [];
  // Scripts hold the text of styles in their strings; they are taken out before styles are looked for.
  const rest = page.replace(/<script\b[^>]*>([\s\S]*?)<\/script>/gi, (_tag, body: string) => {
    if (body !== '') scripts.push(sourceHash(body));
    return '';
  });
  const styles = [...rest.matchAll(/<style\b[^>]*>([\s\S]*?)<\/style>/gi)].map((found) => sourceHash(found[1]));
  if (!inlined && scripts.length + styles.length > 0) {
    throw new Error('The served page allows code by origin alone, but some is written into it.');
  }
  const own = inlined ? [] : ["'self'"];
  return [
    "default-src 'none'",
    `script-src ${[...own, ...scripts].join(' ')}`,
    `worker-src ${['blob:', ...own].join(' ')}`,
    `style-src-elem ${[...own, ...styles, EMPTY_STYLE].join(' ')}`,
    // Plotly sizes sub- and superscripts in its labels by style attributes.
    "style-src-attr 'unsafe-inline'",
    // Figures are exported as pictures through data: and blob: addresses.
    `img-src ${[...own, 'data:', 'blob:'].join(' ')}`,
    ...(inlined ? [] : ["manifest-src 'self'"]),
    "connect-src 'none'",
    "base-uri 'none'",
    "form-action 'none'",
    "object-src 'none'",
  ].join('; ');
}

function sourceHash(text: string): string {
  return `'sha256-${createHash('sha256').update(text).digest('base64')}'`;
}
