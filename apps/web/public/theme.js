// Runs before the first paint, so that a night-theme screen never flashes white.
// The key and the values are those of src/app/theme.ts; a test holds the two together.
try {
  const choice = localStorage.getItem("beadroll.theme");
  if (choice === "light" || choice === "night") document.documentElement.dataset.theme = choice;
} catch {
  // Storage is refused: the system's own preference stays.
}
