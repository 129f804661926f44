import { DOCS_STYLES } from '#server/docs/docs.styles';
import type { Examples } from '#server/docs/examples';
import { fieldsOf, type Field } from '#server/docs/fields';
import { html, type Html } from '#server/docs/html';
import { DOCUMENTED, ERRORS } from '#server/docs/openapi';
import { SCRIPT_CALLS_PER_ADDRESS } from '#server/limits/limits.rules';

type Documented = (typeof DOCUMENTED)[number];

function table(label: string, heads: readonly string[], rows: readonly (readonly string[])[]): Html {
  const row = ([first = '', ...others]: readonly string[]) =>
    html`<tr>
      <td><code>${first}</code></td>
      ${others.map((text) => html`<td>${text}</td>`)}
    </tr>`;
  return html`<div class="scroll" tabindex="0" role="region" aria-label="${label}">
    <table>
      <thead>
        <tr>
          ${heads.map((head) => html`<th scope="col">${head}</th>`)}
        </tr>
      </thead>
      <tbody>
        ${rows.map(row)}
      </tbody>
    </table>
  </div>`;
}

function fieldTable(title: string, fields: readonly Field[], request: boolean): Html {
  const rows = fields.map(({ path, kind, optional, about }) => [
    path,
    request && optional ? `${kind} (may be left out)` : kind,
    about,
  ]);
  return html`<h3>${title}</h3>
    ${table(title, ['field', 'kind', 'meaning'], rows)}`;
}

function code(label: string, text: string): Html {
  return html`<h3>${label}</h3>
    <pre tabindex="0" role="region" aria-label="${label}"><code>${text}</code></pre>`;
}

function routeSection({ name, endpoint, title, about }: Documented, examples: Examples, url: string): Html {
  const { request, answer } = examples[name];
  const call = `curl ${url}${endpoint.path} -H 'content-type: application/json' -d '${JSON.stringify(request)}'`;
  return html`<section aria-labelledby="${name}">
    <h2 id="${name}">${title}</h2>
    <p><code>${endpoint.method} ${endpoint.path}</code></p>
    <p>${about}</p>
    ${fieldTable(`${title}: what is sent`, fieldsOf(endpoint.body, 'input'), true)}
    ${fieldTable(`${title}: what is answered`, fieldsOf(endpoint.response, 'output'), false)}
    ${code(`${title}: an example`, call)}
    ${code(`${title}: its answer, lists of more than eight cut to their first three`, JSON.stringify(answer, null, 2))}
  </section>`;
}

function errorSection(): Html {
  return html`<section aria-labelledby="failures">
    <h2 id="failures">When it cannot answer</h2>
    <p>Every failure has one body: <code>{ "error": { "code", "message", "details"? } }</code>.</p>
    ${table('Failures', ['status', 'meaning'], Object.entries(ERRORS))}
  </section>`;
}

/** The routes for scripts and lessons, for people to read: no script, nothing from elsewhere. */
export function docsPage(examples: Examples, publicUrl: string): string {
  const page = html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>For scripts and lessons · Siltline</title>
        <style>
          ${DOCS_STYLES}
        </style>
      </head>
      <body>
        <header>
          <p><a href="/">Siltline</a></p>
          <h1>For scripts and lessons</h1>
          <p>
            What Siltline computes can be asked for without an account and without a cookie. Nothing is kept.
            At most ${SCRIPT_CALLS_PER_ADDRESS.free} calls a minute are answered for one address. Send and
            read JSON in UTF-8. The same in <a href="/api/openapi.json">OpenAPI</a>.
          </p>
          <p>
            The index is a model’s and the limits are customs: players, halls, tempo and intentions differ.
          </p>
          <ul>
            ${DOCUMENTED.map(({ name, title }) => html`<li><a href="#${name}">${title}</a></li>`)}
            <li><a href="#failures">When it cannot answer</a></li>
          </ul>
        </header>
        <main>
          ${DOCUMENTED.map((documented) => routeSection(documented, examples, publicUrl))} ${errorSection()}
        </main>
      </body>
    </html>`;
  return page.text;
}
