/** A database of an earlier release belongs to the program itself. */
export async function takeOver(sql, program) {
  const [old] = await sql`
    select 1 from pg_class join pg_roles on pg_roles.oid = relowner
    where rolname = ${program} and relkind = 'r' and relnamespace = 'public'::regnamespace limit 1`
  if (old) await sql`reassign owned by ${sql(program)} to current_user`
}

/**
 * The program may read and write rows and nothing else: it cannot alter, drop or empty a table, nor lift a trigger. What
 * the trigger `refuse_change` refuses whoever asks is not granted to it in the first place.
 */
export async function grantToProgram(sql, program) {
  await sql.begin(async (tx) => {
    const role = tx(program)
    await tx`grant select on all tables in schema drizzle to ${role}`
    await tx`grant usage on schema drizzle to ${role}`
    for (const schema of [tx('public'), tx('graphile_worker')]) {
      await tx`grant usage on schema ${schema} to ${role}`
      await tx`grant select, insert, update, delete on all tables in schema ${schema} to ${role}`
      await tx`grant usage, select on all sequences in schema ${schema} to ${role}`
    }
    for (const { name, updates, deletes } of await refusedChanges(tx)) {
      if (updates) await tx`revoke update on ${tx(name)} from ${role}`
      if (deletes) await tx`revoke delete on ${tx(name)} from ${role}`
    }
    // the queue's tables admit nobody but their owner, row by row
    const closed = await tx`
      select tablename as name from pg_tables
      where schemaname = 'graphile_worker' and rowsecurity and not exists (
        select 1 from pg_policies where pg_policies.tablename = pg_tables.tablename and ${program} = any(roles))`
    for (const { name } of closed) {
      await tx`create policy ${role} on ${tx(`graphile_worker.${name}`)} to ${role} using (true) with check (true)`
    }
  })
}

const refusedChanges = (tx) => tx`
  select relname as name, bool_or(tgtype & 8 > 0) as deletes, bool_or(tgtype & 16 > 0) as updates
  from pg_trigger join pg_class on pg_class.oid = tgrelid
  where tgfoid = 'refuse_change'::regproc and tgattr = ''::int2vector and tgqual is null
  group by relname`
