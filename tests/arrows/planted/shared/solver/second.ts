import { first } from './first';

export const second = (): unknown => first;
