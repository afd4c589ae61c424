export const lift = 'lift';
