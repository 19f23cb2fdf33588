/** A tablet as it is spoken of: `tablet B2`. A label may say already that it is a tablet's. */
export const tabletWords = (label: string): string => (/^tablet\b/i.test(label) ? label : `tablet ${label}`);
