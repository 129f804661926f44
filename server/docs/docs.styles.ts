import { Html } from '#server/docs/html';

/** The look of the pages, in a page that stands by itself. */
export const DOCS_STYLES = new Html(`
:root { color-scheme: light dark; --page: #f5f2eb; --surface: #ffffff; --ink: #1b2a2c; --quiet: #55676a; --line: #dad4c7; --action: #0f5c66; }
@media (prefers-color-scheme: dark) {
  :root { --page: #10191b; --surface: #172427; --ink: #eaf0ee; --quiet: #9db0b1; --line: #2e4145; --action: #5fb7bf; }
}
* { box-sizing: border-box; }
body { margin: 0; background: var(--page); color: var(--ink); font: 1rem/1.5 'IBM Plex Sans', system-ui, sans-serif; }
main, header { max-width: 64rem; margin: 0 auto; padding: 1.5rem 1rem; }
main { padding-top: 0; }
h1 { font-size: 1.75rem; margin: 0 0 0.5rem; }
h2 { font-size: 1.35rem; margin: 2.5rem 0 0.5rem; border-top: 1px solid var(--line); padding-top: 1.5rem; }
h3 { font-size: 1rem; margin: 1.5rem 0 0.5rem; }
p, li { max-width: 44rem; }
a { color: var(--action); }
code, pre { font-family: ui-monospace, 'DejaVu Sans Mono', monospace; font-size: 0.875rem; }
pre { background: var(--surface); border: 1px solid var(--line); border-radius: 4px; padding: 0.75rem; overflow: auto; max-height: 26rem; }
.scroll { overflow-x: auto; }
table { border-collapse: collapse; width: 100%; background: var(--surface); border: 1px solid var(--line); }
th, td { text-align: left; vertical-align: top; padding: 0.375rem 0.625rem; border-bottom: 1px solid var(--line); }
th { color: var(--quiet); font-weight: 600; }
td:first-child { white-space: nowrap; }
a:focus-visible, pre:focus-visible, .scroll:focus-visible { outline: 2px solid var(--action); outline-offset: 2px; }
`);
