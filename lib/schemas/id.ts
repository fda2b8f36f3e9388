import { z } from 'zod';

/** A UUIDv7 made where the record is made. Its time part is never trusted. */
export const idSchema = z.uuid('That address is not one of ours. Go back and try again.');
