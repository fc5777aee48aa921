/** What the codes of next-auth, and ours, mean to somebody at the door. */
const errors: Record<string, string> = {
  CredentialsSignin: 'That address and password do not go together. Try again, or have a link mailed to you below.',
  RateLimited: 'Too many tries in a short time. Wait ten minutes, then try again.',
  Verification: 'That link was used already or has run out. Have a new one mailed to you below.',
  AccessDenied: 'That link opens nothing here. Have a new one mailed to you below.',
  EmailSignin: 'No mail can be sent to that address. Check it and try again.',
}

export function signInError(code: string): string {
  return errors[code] ?? 'Signing in did not work. Please try again.'
}

const notices: Record<string, string> = {
  out: 'You are signed out on this device.',
  everywhere: 'You are signed out on every device.',
  reset: 'Your new password is set, and you are signed out on every device. Sign in with it.',
}

export function signInNotice(code: string): string | undefined {
  return notices[code]
}
