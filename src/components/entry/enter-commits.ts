/** In a form of many figures Enter takes the figure over and does not send the form: for `@keydown.enter` on the form. */
export function enterCommits(event: KeyboardEvent): void {
  if (event.target instanceof HTMLInputElement) event.preventDefault()
}
