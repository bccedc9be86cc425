/** Gives the page's print and copy buttons their work; without scripts they are not shown. */
export function wireVerdictPage(): void {
  for (const button of document.querySelectorAll<HTMLButtonElement>('[data-print]')) {
    button.hidden = false;
    button.addEventListener('click', () => window.print());
  }
  for (const button of document.querySelectorAll<HTMLButtonElement>('[data-copy]')) {
    button.hidden = false;
    button.addEventListener('click', async () => {
      await navigator.clipboard.writeText(button.dataset['copy'] ?? '');
      button.append(` · ${button.dataset['copied']}`);
      button.disabled = true;
    });
  }
}
