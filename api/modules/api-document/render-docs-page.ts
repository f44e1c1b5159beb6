import { createHash } from 'node:crypto';
import type { Access, Endpoint } from '../../endpoint.ts';
import { toOpenApiPath } from './build-openapi-document.ts';

const style = `
  body { margin: 2rem auto; max-width: 60rem; padding: 0 1rem; background: #f7f4ec; color: #20262b;
    font: 1rem/1.5 system-ui, sans-serif; }
  table { border-collapse: collapse; width: 100%; }
  th, td { border-bottom: 1px solid #20262b40; padding: 0.4rem 0.6rem 0.4rem 0; text-align: left;
    vertical-align: top; }
  code { font-size: 0.95em; overflow-wrap: anywhere; }
`;

/** The policy of this page alone: its own style and nothing else. */
export const docsPagePolicy = [
  "default-src 'none'",
  `style-src 'sha256-${createHash('sha256').update(style).digest('base64')}'`,
  "base-uri 'none'",
  "form-action 'none'",
  "frame-ancestors 'none'",
].join('; ');

/** The API's endpoints as a plain page, for people who write scripts. */
export function renderDocsPage(endpoints: readonly Endpoint[], title: string): string {
  const rows = endpoints.map(
    (endpoint) => `
      <tr>
        <td><code>${endpoint.method.toUpperCase()}</code></td>
        <td><code>${escapeHtml(toOpenApiPath(endpoint.path))}</code></td>
        <td>${escapeHtml(endpoint.summary)}</td>
        <td>${escapeHtml(describeAccess(endpoint.access))}</td>
      </tr>`,
  );
  return `<!doctype html>
<html lang="en">
  <head>
    <meta charset="utf-8">
    <meta name="viewport" content="width=device-width, initial-scale=1">
    <title>${escapeHtml(title)}</title>
    <style>${style}</style>
  </head>
  <body>
    <h1>${escapeHtml(title)}</h1>
    <p>Every parameter, body and answer stands in the <a href="/api/openapi.json">OpenAPI 3.1 document</a>;
      the format of a study in <a href="/api/schemas/study.json">its JSON Schema</a>. Errors are problem
      details (RFC 9457).</p>
    <table>
      <thead>
        <tr><th scope="col">Method</th><th scope="col">Path</th><th scope="col">What it does</th><th scope="col">For</th></tr>
      </thead>
      <tbody>${rows.join('')}
      </tbody>
    </table>
  </body>
</html>
`;
}

function describeAccess(access: Access): string {
  if (access === 'anybody') return 'everybody';
  return access === 'signed-in' ? 'signed in' : access.join(', ');
}

function escapeHtml(text: string): string {
  const entities: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
  };
  return text.replace(/[&<>"]/g, (sign) => entities[sign] ?? sign);
}
