// Opens the dialog of ReconnectModal.razor while the connection is lost.
const dialog = document.getElementById('components-reconnect-modal');

dialog?.addEventListener('components-reconnect-state-changed', event => {
  const state = event.detail.state;
  if (state === 'show' && !dialog.open) dialog.showModal();
  else if (state === 'hide') dialog.close();
  else if (state === 'failed') document.addEventListener('visibilitychange', rejoin);
  else if (state === 'rejected') location.reload();
});

dialog?.querySelector('[data-rejoin]').addEventListener('click', () => location.reload());

async function rejoin() {
  if (document.visibilityState !== 'visible') return;
  document.removeEventListener('visibilitychange', rejoin);
  try {
    if (!await Blazor.reconnect() && !await Blazor.resumeCircuit()) location.reload();
  } catch {
    document.addEventListener('visibilitychange', rejoin);
  }
}
