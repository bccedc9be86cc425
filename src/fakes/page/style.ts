/** Colours and sizes are the product's own tokens, in light and dark. */
export const styleSheet = `
:root {
  --ink: #16212b; --steel: #475866; --line: #c9d1d6; --edge: #74838d; --bench: #eef1ee; --card: #fff;
  --petrol: #0b5563; --petrol-hover: #083f4a; --on-petrol: #fff; --good: #1e6b3a;
  --caution: #8a5a00; --caution-ground: #fff4d6; --stop: #a3231f; --stop-ground: #fdecea;
  color-scheme: light dark;
}
@media (prefers-color-scheme: dark) {
  :root {
    --ink: #e8edea; --steel: #a9b7bf; --line: #3a4750; --edge: #7a8a94; --bench: #11181d; --card: #1b252c;
    --petrol: #5cc0cf; --petrol-hover: #86d5e0; --on-petrol: #06222a; --good: #79cf97;
    --caution: #f0c35a; --caution-ground: #33290f; --stop: #ff9a92; --stop-ground: #3a1816;
  }
}
* { box-sizing: border-box; }
body {
  margin: 0; min-height: 100dvh; display: flex; flex-direction: column;
  background: var(--bench); color: var(--ink); font: 16px/24px system-ui, sans-serif;
}
a { color: var(--petrol); overflow-wrap: anywhere; }
a:hover { color: var(--petrol-hover); }
:focus-visible { outline: 3px solid var(--petrol); outline-offset: 2px; }
h1 { font-size: 20px; line-height: 28px; margin: 0; }
p { margin: 0; }
button, .button {
  min-height: 48px; padding: 8px 16px; border: 2px solid var(--petrol); border-radius: 6px;
  background: var(--card); color: var(--petrol); font: inherit; cursor: pointer;
}
button.main { background: var(--petrol); color: var(--on-petrol); font-weight: 600; }
button:hover { border-color: var(--petrol-hover); color: var(--petrol-hover); }
button.main:hover { background: var(--petrol-hover); color: var(--on-petrol); }
textarea {
  width: 100%; min-height: 56px; padding: 12px; border: 2px solid var(--edge); border-radius: 6px;
  background: var(--card); color: var(--ink); font: inherit; resize: vertical;
}
.quiet { color: var(--steel); font-size: 14px; line-height: 20px; }
.bar {
  display: flex; flex-wrap: wrap; gap: 8px 24px; align-items: center; justify-content: space-between;
  padding: 8px 16px; background: var(--card); border-bottom: 2px solid var(--edge);
}
.bar nav { display: flex; gap: 4px; }
.bar nav a { display: flex; align-items: center; min-height: 48px; padding: 0 12px; text-decoration: none; }
.bar nav a[aria-current] { color: var(--ink); font-weight: 600; box-shadow: inset 0 -4px 0 var(--petrol); }
.clock { display: flex; flex-wrap: wrap; gap: 8px 16px; align-items: center; color: var(--steel); }
.sheet { width: 100%; max-width: 960px; margin: 0 auto; padding: 24px 16px 48px; display: grid; gap: 16px; grid-template-columns: minmax(0, 1fr); align-content: start; }
.phones { flex: 1; width: 100%; max-width: 1120px; margin: 0 auto; padding: 16px; display: grid; gap: 16px; grid-template-columns: 320px minmax(0, 1fr); align-items: start; align-content: start; }
.pick { grid-column: 1 / -1; }
.rows { list-style: none; margin: 0; padding: 0; display: grid; gap: 8px; grid-template-columns: minmax(0, 1fr); }
.row {
  display: block; min-height: 72px; padding: 8px 12px; background: var(--card); color: var(--ink);
  border: 2px solid var(--edge); border-radius: 6px; text-decoration: none; overflow-wrap: anywhere;
}
.row[aria-current] { border-color: var(--petrol); box-shadow: inset 6px 0 0 var(--petrol); padding-left: 18px; }
.row:hover { border-color: var(--petrol); color: var(--ink); }
.row .top { display: flex; flex-wrap: wrap; justify-content: space-between; gap: 0 12px; }
.row strong { font-weight: 600; }
.cut { display: block; overflow: hidden; text-overflow: ellipsis; white-space: nowrap; }
.phone {
  display: flex; flex-direction: column; height: calc(100dvh - 100px); min-height: 420px; max-width: 560px; width: 100%;
  background: var(--card); border: 3px solid var(--ink); border-radius: 24px; overflow: hidden;
}
.phone > header { padding: 12px 20px; border-bottom: 2px solid var(--line); }
.talk { flex: 1; overflow-y: auto; padding: 16px; display: flex; flex-direction: column; gap: 16px; background: var(--bench); }
.bubble { max-width: 88%; }
.bubble .words {
  padding: 10px 14px; border: 2px solid var(--edge); border-radius: 4px 16px 16px 16px; background: var(--card);
  white-space: pre-wrap; overflow-wrap: anywhere;
}
.bubble.mine { align-self: flex-end; text-align: right; }
.bubble.mine .words { text-align: left; border-radius: 16px 4px 16px 16px; background: var(--petrol); border-color: var(--petrol); color: var(--on-petrol); }
.bubble.mine .words a { color: inherit; }
.bubble.carrier .words { border-style: dashed; }
.answer { display: grid; grid-template-columns: 1fr auto; gap: 8px; padding: 12px; border-top: 2px solid var(--line); align-items: end; }
.answer label { grid-column: 1 / -1; font-weight: 600; }
.note { padding: 12px 16px; border-left: 6px solid var(--caution); background: var(--caution-ground); color: var(--ink); }
.bad { color: var(--stop); }
.fine { color: var(--good); }
.late { color: var(--caution); }
.mail { background: var(--card); border: 2px solid var(--edge); border-radius: 6px; padding: 24px; overflow-wrap: anywhere; }
.mail .words { white-space: pre-wrap; margin-top: 16px; padding-top: 16px; border-top: 2px solid var(--line); }
dl { display: grid; grid-template-columns: auto 1fr; gap: 4px 16px; margin: 8px 0 0; }
dt { color: var(--steel); }
dd { margin: 0; }
.delivery { display: grid; grid-template-columns: 1fr auto; gap: 8px 16px; align-items: center; }
.delivery code { font-size: 14px; overflow-wrap: anywhere; }
@media (max-width: 767px) {
  .bar, .phones, .sheet { padding-left: 12px; padding-right: 12px; }
  .clock { width: 100%; justify-content: space-between; gap: 8px; }
  .phones { grid-template-columns: minmax(0, 1fr); }
  .phones:has(.phone) .list { display: none; }
  .phones:has(.phone) { padding: 0; }
  .phone { height: calc(100dvh - 122px); border: 0; border-radius: 0; }
  .phone > header { display: flex; flex-wrap: wrap; gap: 0 16px; align-items: baseline; padding: 8px 12px; }
  .delivery { grid-template-columns: minmax(0, 1fr); }
  .mail { padding: 16px; }
}
@media (min-width: 768px) { .back { display: none; } }
`;

/**
 * Fetches the page again every two seconds while somebody looks and replaces what changed in its live parts, so that
 * a field being typed in keeps its words. A talk that stood at its end stays there.
 */
export const refreshScript = `
const everyMilliseconds = 2000;
const talk = () => document.getElementById('talk');
const toEnd = () => { const log = talk(); if (log) log.scrollTop = log.scrollHeight; };
toEnd();
async function refresh() {
  if (document.hidden) return;
  let text;
  try { text = await (await fetch(location.href)).text(); } catch { return; }
  const fresh = new DOMParser().parseFromString(text, 'text/html');
  for (const part of document.querySelectorAll('[data-live]')) {
    const next = fresh.getElementById(part.id);
    if (!next || next.innerHTML === part.innerHTML) continue;
    const stoodAtEnd = part.scrollHeight - part.scrollTop - part.clientHeight < 40;
    part.replaceChildren(...next.childNodes);
    if (part === talk() && stoodAtEnd) toEnd();
  }
}
setInterval(refresh, everyMilliseconds);
document.addEventListener('keydown', (event) => {
  const field = event.target;
  if (event.key !== 'Enter' || event.shiftKey || !(field instanceof HTMLTextAreaElement)) return;
  event.preventDefault();
  if (field.value.trim() !== '') field.form.requestSubmit();
});
`;
