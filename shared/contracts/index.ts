/**
 * What api, worker and web agree on. Schemas, the types inferred from them, and the
 * two things all sides must say alike: who may do what, and which fields of a document are wrong.
 */
export * from './machines';
export * from './people';
export * from './problem';
export * from './programs';
export * from './report';
export * from './roles';
export * from './setup';
export * from './wrong-fields';
