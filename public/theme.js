// Before the first paint: the room one was in last, in the theme that the person chose. Keys as in src/lib/theme.ts.
(() => {
  let room = 'floor';
  let choice = 'room';
  try {
    room = localStorage.getItem('tapeline.room') === 'desk' ? 'desk' : 'floor';
    choice = localStorage.getItem('tapeline.theme') ?? 'room';
  } catch {
    // storage is switched off: every visit starts on the floor, in its own theme
  }
  const theme = choice === 'light' || choice === 'dark' ? choice : room === 'desk' ? 'light' : 'dark';
  document.documentElement.dataset.room = room;
  document.documentElement.dataset.theme = theme;
})();
