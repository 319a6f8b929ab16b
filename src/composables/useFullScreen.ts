/** Takes the whole screen, or gives it back; a browser that refuses leaves the page as it is. */
export function useFullScreen() {
  async function toggle(): Promise<void> {
    if (document.fullscreenElement) await document.exitFullscreen()
    else if (document.fullscreenEnabled) await document.documentElement.requestFullscreen()
  }
  return { toggle }
}
