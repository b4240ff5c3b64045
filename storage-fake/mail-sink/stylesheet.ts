export const STYLESHEET = `
:root { color-scheme: light dark; --ink: #1c2126; --quiet: #525c66; --ground: #fafaf8;
  --sheet: #ffffff; --line: #c9ced3; --link: #0b57a4; --notice: #fff3d6; --notice-ink: #4a3600; }
@media (prefers-color-scheme: dark) { :root { --ink: #e6e9ec; --quiet: #a9b3bd; --ground: #15181b;
  --sheet: #1d2125; --line: #3d454d; --link: #8fc1f5; --notice: #3a2f12; --notice-ink: #f5e2b0; } }
* { box-sizing: border-box; }
body { margin: 0; background: var(--ground); color: var(--ink);
  font: 16px/1.5 system-ui, "Segoe UI", "DejaVu Sans", sans-serif; }
a { color: var(--link); }
a:focus-visible, input:focus-visible, button:focus-visible, pre:focus-visible
  { outline: 3px solid var(--link); outline-offset: 2px; }
.notice { margin: 0; padding: 10px 24px; background: var(--notice); color: var(--notice-ink); }
main { max-width: 1080px; margin: 0 auto; padding: 24px; }
h1 { margin: 0 0 16px; font-size: 24px; line-height: 1.25; overflow-wrap: anywhere; }
h2 { margin: 24px 0 8px; font-size: 18px; }
form { display: flex; flex-wrap: wrap; gap: 8px; align-items: center; margin-bottom: 16px; }
input, button { font: inherit; color: inherit; background: var(--sheet);
  border: 1px solid var(--quiet); border-radius: 4px; padding: 6px 10px; }
.scroll { overflow-x: auto; }
table { width: 100%; border-collapse: collapse; background: var(--sheet);
  border: 1px solid var(--line); }
th, td { padding: 8px 12px; text-align: left; vertical-align: top;
  border-bottom: 1px solid var(--line); overflow-wrap: anywhere; }
th { color: var(--quiet); font-weight: 600; }
td.time, td.size { white-space: nowrap; font-variant-numeric: tabular-nums; }
dl { display: grid; grid-template-columns: max-content 1fr; gap: 4px 16px; margin: 0 0 16px; }
dt { color: var(--quiet); }
dd { margin: 0; overflow-wrap: anywhere; }
pre { margin: 0; padding: 16px; white-space: pre-wrap; overflow-wrap: anywhere;
  background: var(--sheet); border: 1px solid var(--line); font: inherit; }
iframe { width: 100%; height: 70vh; background: #ffffff; border: 1px solid var(--line); }
`;
