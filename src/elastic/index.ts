export * from './closed-forms';
