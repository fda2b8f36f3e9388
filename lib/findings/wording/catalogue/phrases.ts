/** Sentences that many rows share. */
export const ELECTRICIAN = 'A licensed electrician, following the local code.';
export const ELECTRICIAN_NOW = 'A licensed electrician, following the local code, before it is used again.';
export const ELECTRICIAN_OR_OWNER =
  'A licensed electrician, or a handy owner with the breaker off and checked, where the local code allows it.';
export const OWNER = 'The owner. Ask a licensed electrician if anything looks burned or loose.';

export const NOT_OPENED = 'The wiring was not opened. Where the cause sits, here or upstream, is not known.';
export const DO_NOT_OPEN = 'Do not open the receptacle. Parts can be live even where the lamps stay off.';

/** What was read, after the place. */
export const READ =
  "{% if lamps != '' %} Lamps: {{ lamps }}.{% endif %}{% if volts != '' %} Meter: {{ volts }}.{% endif %}{% if sensor != '' %} Live-wire sensor: {{ sensor }}.{% endif %}";
/** What the reading can mean. Percentages are never made up. */
export const MEANS =
  "Most often: {{ most_often }}.{% if also_possible != '' %} Also possible: {{ also_possible }}.{% endif %}";

/** Edition years, for protection that was not shown. */
export const SINCE =
  "{% if since != '' %} The national model code first asked for it at such places in its {{ since }} edition.{% endif %}{% if asked_when_built == 'no' %} When this house was built it was not yet asked for.{% endif %}{% if state_note != '' %} {{ state_note }}{% endif %}";
