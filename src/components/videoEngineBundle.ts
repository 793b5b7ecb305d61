import videojs from 'video.js';
import 'video.js/dist/video-js.css';

export { videojs };
