/** What mails say, in plain words. */
export const enMail = {
  hello: (name: string) => `Hello ${name},`,
  code: (address: string, code: string) =>
    `Does the button not work? Open ${address} and type this code with your e-mail address: ${code}`,
  notYours: 'Was this mail not meant for you? You need do nothing; the link opens nothing without a click.',
  invitation: {
    subject: (firm: string) => `Your invitation to ${firm}`,
    says: (firm: string) =>
      `${firm} asks you to join them in Ohmstead. The link is yours alone and works for seven days.`,
    button: 'Accept the invitation',
  },
  reset: {
    subject: 'Set a new password',
    says: 'Somebody, most likely you, asked to set a new password. The link works for ten minutes, once.',
    button: 'Set a new password',
  },
  signIn: {
    subject: 'Your link to sign in',
    says: 'The link signs you in. It works for ten minutes, once.',
    button: 'Sign in',
  },
  report: {
    subject: (street: string, now: number) =>
      now === 0
        ? `Your report on ${street}`
        : `Your report on ${street}: ${now === 1 ? 'one thing' : `${now} things`} to leave alone`,
    ready: (street: string) => `Your report on ${street} is ready.`,
    now: 'Stop using this now:',
    days: (count: number) =>
      `${count === 1 ? 'One more place' : `${count} more places`} should be repaired within days. The report says which, why, and whom to ask.`,
    nothingNow:
      'Nothing in it has to be left alone today. Please read it whole: it also says what the tests could not show.',
    button: 'Open the report',
    until: (date: string) =>
      `The link is yours alone and works until ${date}. Nobody else can read the report unless you name them.`,
    questions: (phone: string) =>
      phone ? `Questions? Answer this mail or call ${phone}.` : 'Questions? Answer this mail.',
    foot: (firm: string, version: string) =>
      `${firm} · ${version}. This mail shows no findings beyond those that cannot wait.`,
  },
};
