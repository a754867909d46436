/** A photo as it leaves a phone is scaled to about 1,600 px: under 1 MB. More is no photo of ours. Bytes. */
export const PHOTO_MAX_BYTES = 8 * 1024 * 1024;
/** One piece of a photo: small enough to get through between two dead spots. Bytes. */
export const PIECE_BYTES = 128 * 1024;
/** What a phone scales the longest side of a photo down to, pixels. */
export const PHOTO_LONGEST_SIDE = 1600;
