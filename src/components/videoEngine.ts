// read by video.js when it is loaded: it would put a style element into the page, which the policy forbids
declare global {
  interface Window {
    VIDEOJS_NO_DYNAMIC_STYLE?: boolean;
  }
}
window.VIDEOJS_NO_DYNAMIC_STYLE = true;

/** video.js with its styles, in a chunk of its own that is fetched when a picture is first shown. */
export const loadVideoEngine = async () => (await import('./videoEngineBundle')).videojs;
