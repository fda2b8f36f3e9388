import { z } from 'zod';

const ONE_ADDRESS =
  /^[a-z0-9!#$%&'*+/=?^_`{|}~-]+(\.[a-z0-9!#$%&'*+/=?^_`{|}~-]+)*@([a-z0-9]([a-z0-9-]{0,61}[a-z0-9])?\.)+[a-z]([a-z0-9-]{0,61}[a-z0-9])?$/;

/** One plain address in its canonical form. Compatibility characters are folded first, so that no second "@" hides in one. */
export const emailSchema = z
  .string('Enter an e-mail address, like name@firm.example')
  .max(254, 'Enter a shorter e-mail address: at most 254 characters')
  .transform((text) => text.normalize('NFKC').trim().toLowerCase())
  .pipe(
    z
      .string()
      .min(1, 'Enter an e-mail address, like name@firm.example')
      .max(254, 'Enter a shorter e-mail address: at most 254 characters')
      .regex(ONE_ADDRESS, 'Check the e-mail address. It should look like name@firm.example'),
  );
