// Hosts that answer a store request in each way the card can meet. The one without a handler is left alone on purpose.
const pauseOf = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds));

const answers = {
  keeps: async () => {
    await pauseOf(800);
    return 'shelf 3, tray 12';
  },
  refuses: async () => {
    await pauseOf(800);
    throw new Error('The tray is locked for stocktaking.');
  },
};

for (const [name, answer] of Object.entries(answers)) {
  document.querySelector(`[data-store="${name}"]`).addEventListener('solute-store', (event) => event.detail.waitUntil(answer()));
}
