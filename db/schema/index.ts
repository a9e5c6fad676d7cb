/** Tables of the database as Kysely sees them; one file an aggregate. */
// eslint-disable-next-line @typescript-eslint/no-empty-object-type -- aggregates add themselves here
export interface Database {}
