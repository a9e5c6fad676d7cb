/** The landing page and the ways in and out. */
export const entry = {
  landing: {
    heading: 'The class writes the second voice.',
    lede: 'A live board for species counterpoint: the teacher puts up a cantus firmus, every phone in the room proposes a note, and what the rules say of it is read on the spot.',
    joinLabel: 'Join a lesson',
    joinHint: 'Type the six syllables on the wall, such as re fa mi la sol do.',
    joinGo: 'Join',
    tapInstead: 'Tap them on a staff instead',
    notSyllable: (text: string) => `“${text}” is not one of do, re, mi, fa, sol, la and ti.`,
    tooMany: 'A code has six syllables; these are more.',
    tooFew: (missing: number) =>
      missing === 6
        ? 'Type the six syllables first.'
        : missing === 1
          ? 'One syllable is missing.'
          : `${missing} syllables are missing; a code has six.`,
    teaching: 'Teaching, or in a course?',
    makeAccount: 'Make an account',
    yourCourses: 'Go to your courses',
    pictureLabel:
      'A bicinium of eleven bars: a cantus firmus in D, and above it the counterpoint that Fux wrote against it.',
    pictureCaption: 'J. J. Fux, Gradus ad Parnassum, Vienna 1725: the first exercise.',
    gestures: ['first gesture', 'second gesture: apex A, then home'] as const,
  },
  fields: {
    name: 'Name',
    nameHint: 'As your teacher and your class should read it.',
    email: 'E-mail address',
    password: 'Password',
    passwordHint: 'Ten characters or more. A few words in a row are easy to remember.',
    newPassword: 'New password',
    currentPassword: 'Password you have now',
  },
  signIn: {
    title: 'Sign in',
    go: 'Sign in',
    forgot: 'Set a new password',
    noAccount: 'No account yet?',
    makeOne: 'Make one',
    guest: 'A guest in one lesson needs no account:',
    join: 'join by its syllables',
    unverifiedTitle: 'Your address is not confirmed yet.',
    unverified: (email: string) => `Open the link in the message sent to ${email}.`,
    sendAgain: 'Send the message again',
    sentAgain: 'The message is on its way.',
    signedInAs: 'You are signed in already.',
    demoTitle: 'This is the demo',
    demoLead: 'Sign in as one of these invented people. All share one password.',
    demoUse: 'Fill in',
    demoFill: (name: string) => `Fill in the address of ${name}`,
    demoPassword: (password: string) => `Password: ${password}`,
  },
  signUp: {
    title: 'Make an account',
    go: 'Make the account',
    haveOne: 'Have an account?',
    kept: 'We keep your name, your address and what you write in lessons, for as long as your school keeps the course. You can see and remove your sessions, and ask the school to delete the rest.',
    young: 'If you are under age, your school’s own rules decide; ask your teacher first.',
    sentTitle: 'Look for our message',
    sent: (email: string) =>
      `We have sent a link to ${email}. Open it, and the account is yours. It may take a minute, and it may lie among the unwanted mail.`,
    demoMail: 'In this demo no message leaves the house: read it here',
  },
  forgot: {
    title: 'Set a new password',
    lede: 'Tell us your address; we will send a link that lets you choose a new password.',
    go: 'Send the link',
    sentTitle: 'Look for our message',
    sent: (email: string) =>
      `If there is an account with ${email}, a link is on its way. It holds for one hour.`,
  },
  reset: {
    title: 'Choose a new password',
    go: 'Keep this password',
    doneTitle: 'Your password is changed.',
    done: 'Every session that was open with the old one has ended.',
    badTitle: 'This link no longer works.',
    bad: 'It was used already, or its hour is over. Ask for another.',
    another: 'Ask for another link',
  },
  verify: {
    title: 'Confirming your address',
    busy: 'One moment.',
    doneTitle: 'Your address is confirmed.',
    done: 'The account is yours.',
    on: 'Go on',
    badTitle: 'This link no longer works.',
    bad: 'It was used already, or its day is over. Sign in, and we will send another.',
  },
} as const
