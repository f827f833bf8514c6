// Buttons with data-copy copy that text; with data-copy-from, what that address answers. What happened is said in #said and on the button.
document.addEventListener('click', async event => {
  const button = event.target.closest?.('[data-copy], [data-copy-from]');
  if (!button) return;
  try {
    const from = button.dataset.copyFrom;
    await write(from ? fetchText(from) : Promise.resolve(button.dataset.copy));
    say(button, button.dataset.copied ?? 'Copied.');
  } catch {
    say(button, 'Could not copy.');
  }
});

async function fetchText(address) {
  const answer = await fetch(address);
  if (!answer.ok) throw new Error(answer.statusText);
  return answer.text();
}

// The promise goes into the clipboard item itself: a browser wants the call to follow the click at once.
async function write(text) {
  if (navigator.clipboard?.write && window.ClipboardItem) {
    await navigator.clipboard.write([new ClipboardItem({ 'text/plain': text.then(t => new Blob([t], { type: 'text/plain' })) })]);
    return;
  }
  const area = document.createElement('textarea');
  area.value = await text;
  document.body.append(area);
  area.select();
  const done = document.execCommand('copy');
  area.remove();
  if (!done) throw new Error('refused');
}

function say(button, words) {
  document.getElementById('said').textContent = words;
  button.setAttribute('data-said', words);
  setTimeout(() => button.removeAttribute('data-said'), 2000);
}
