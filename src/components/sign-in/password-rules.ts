/** What a new password has to be, in words; the server checks the same. */
export const passwordRules = '12 characters or more, of any kind; several words do well. Common passwords and words about you are refused.'
