export * from './procedure-document';
