// @ts-check
// Keeps the numbers of a phone page while there is no signal, and sends them as soon as there is one. Without this file
// the page works by plain forms.

const retryMilliseconds = 10_000;
const patience = 15_000;

/** @param {HTMLFormElement} form */
function keepAndRetry(form) {
  const key = `kept:${form.dataset['keep']}`;
  const note = document.createElement('p');
  note.className = 'note';
  note.setAttribute('role', 'status');
  let timer = 0;

  /** @param {string} body */
  async function send(body) {
    clearTimeout(timer);
    /** @type {Response} */
    let answer;
    try {
      answer = await fetch(location.pathname, {
        method: 'POST',
        body: new URLSearchParams(body),
        signal: AbortSignal.timeout(patience),
      });
    } catch {
      // The form's own token makes a second arrival harmless.
      showNotSent(body);
      timer = window.setTimeout(() => send(body), retryMilliseconds);
      return;
    }
    localStorage.removeItem(key);
    if (answer.redirected) location.replace(answer.url);
    else {
      const page = new DOMParser().parseFromString(await answer.text(), 'text/html');
      document.body.replaceWith(page.body);
      start();
    }
  }

  /** @param {string} body */
  function showNotSent(body) {
    const again = document.createElement('button');
    again.type = 'button';
    again.textContent = form.dataset['again'] ?? '';
    again.addEventListener('click', () => send(body));
    note.replaceChildren(form.dataset['notSent'] ?? '', again);
    form.prepend(note);
  }

  form.addEventListener('submit', (event) => {
    const button = event.submitter;
    if (!(button instanceof HTMLButtonElement) || button.value !== 'send') return;
    event.preventDefault();
    const fields = new FormData(form, button);
    const body = new URLSearchParams([...fields].map(([name, value]) => [name, String(value)])).toString();
    localStorage.setItem(key, body);
    void send(body);
  });

  // A page that was closed before its numbers were gone: they are still here.
  const kept = localStorage.getItem(key);
  if (kept !== null) {
    for (const [name, value] of new URLSearchParams(kept)) {
      const field = form.elements.namedItem(name);
      if (field instanceof HTMLInputElement && field.type === 'text') field.value = value;
    }
    void send(kept);
  }
  window.addEventListener('online', () => {
    const waiting = localStorage.getItem(key);
    if (waiting !== null) void send(waiting);
  });
}

function start() {
  const form = document.querySelector('form[data-keep]');
  if (form instanceof HTMLFormElement) keepAndRetry(form);
}

start();
