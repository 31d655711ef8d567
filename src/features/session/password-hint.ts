export const PASSWORD_HINT = 'At least 12 characters of any kind, for example four unrelated words';
