// Keys inside regions with one tab stop. Everything here works on the page as it is drawn; nothing is told to the server but a click.

// A table's rows: arrows, Home, End, Page Up and Page Down move the focus; Enter is the button's own.
const steps = { ArrowDown: 1, ArrowUp: -1, PageDown: 20, PageUp: -20, Home: -1e9, End: 1e9 };

document.addEventListener('keydown', event => {
  if (event.ctrlKey || event.altKey || event.metaKey) return;
  const box = event.target.closest?.('[data-rows]');
  if (box && event.key in steps && event.target.closest('tbody, [data-rows]')) {
    const here = event.target.closest('tbody :is(button, a)');
    if (!here && event.target !== box) return;
    event.preventDefault();
    moveRow(box, here, steps[event.key]);
  }
  // The caret of a combo box stays where it is while its list is walked through.
  if (event.target.getAttribute?.('role') === 'combobox' && (event.key === 'ArrowDown' || event.key === 'ArrowUp')) event.preventDefault();
});

function moveRow(box, here, step) {
  const table = box.querySelector('table');
  const last = Number(table.getAttribute('aria-rowcount'));
  const from = here ? Number(here.closest('tr').getAttribute('aria-rowindex')) : step > 0 ? 1 : last + 1;
  seek(box, Math.min(Math.max(from + step, 2), last), step > 0 ? 1 : -1, 0);
}

// Rows far away are not drawn yet: scroll to them first, then wait until they are.
function seek(box, index, direction, tries) {
  const last = Number(box.querySelector('table').getAttribute('aria-rowcount'));
  const row = box.querySelector(`tbody tr[aria-rowindex="${index}"]`);
  const button = row?.querySelector('button, a');
  if (button) {
    button.focus({ preventScroll: true });
    reveal(box, row);
  } else if (row) {
    // A heading between rows has nothing to focus.
    const next = index + direction;
    if (next >= 2 && next <= last) seek(box, next, direction, tries);
    else if (tries < 40) seek(box, index - direction, -direction, 40);
  } else if (tries < 40) {
    box.scrollTop = box.scrollHeight * (index - 2) / last;
    setTimeout(() => seek(box, index, direction, tries + 1), 50);
  }
}

function reveal(box, row) {
  const head = box.querySelector('thead')?.offsetHeight ?? 0;
  const top = row.offsetTop - head;
  if (top < box.scrollTop) box.scrollTop = top;
  else if (row.offsetTop + row.offsetHeight > box.scrollTop + box.clientHeight) box.scrollTop = row.offsetTop + row.offsetHeight - box.clientHeight;
}

// An open menu closes on Escape and on a click elsewhere, and gives the focus back.
document.addEventListener('keydown', event => {
  if (event.key !== 'Escape') return;
  const menu = event.target.closest?.('details.menu[open], details.why[open]');
  if (menu) {
    menu.open = false;
    menu.querySelector('summary').focus();
  }
});
document.addEventListener('click', event => {
  for (const menu of document.querySelectorAll('details.menu[open], details.why[open]')) if (!menu.contains(event.target)) menu.open = false;
});

// The page has a base address, so a link to a place on it would leave it.
document.addEventListener('click', event => {
  const link = event.target.closest?.('a[href^="#"]');
  const place = link && document.getElementById(link.getAttribute('href').slice(1));
  if (!place) return;
  event.preventDefault();
  event.stopPropagation();
  place.scrollIntoView();
  place.focus({ preventScroll: true });
}, true);

// A list that opens below the edge of its pane is brought into sight.
new MutationObserver(changes => {
  for (const { target } of changes) {
    if (target.getAttribute('role') === 'combobox' && target.getAttribute('aria-expanded') === 'true') {
      document.getElementById(target.getAttribute('aria-controls'))?.scrollIntoView({ block: 'nearest' });
    }
  }
}).observe(document.body, { subtree: true, attributeFilter: ['aria-expanded'] });
