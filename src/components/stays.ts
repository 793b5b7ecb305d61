/**
 * Classes for a picture that stays in view on a phone while the list below it is worked on, unless it would fill the
 * window. It stays within the grid that it lies in.
 */
export const stays = 'max-sm:[@media(min-height:40rem)]:sticky top-0 z-10 max-sm:-mx-4 bg-ground';
