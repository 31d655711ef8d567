/** Tables whose rows may go: lines that are replaced with their record, and what runs out by itself. */
export const MAY_DELETE = ['batch_ingredient', 'cook_stage', 'formula_line', 'mark', 'web_session', 'throttle'];
/** Tables that are written once and never changed. */
export const APPEND_ONLY = ['audit_entry', 'lot_standing_change'];

/** Grants of the app's role, made anew after every migration: no DDL, no ownership, no delete but of the named tables. */
export const GRANT_SQL = `
  do $$
  declare relation record; app_role text := current_setting('app.granted_role');
  begin
    execute format('grant usage on schema public, app to %I', app_role);
    execute format('grant execute on all functions in schema app to %I', app_role);
    for relation in select c.relname from pg_class c where c.relnamespace = 'public'::regnamespace and c.relkind = 'r' loop
      execute format('revoke all on public.%I from %I', relation.relname, app_role);
      execute format('grant select, insert on public.%I to %I', relation.relname, app_role);
      if relation.relname = 'migration' then
        execute format('revoke insert on public.%I from %I', relation.relname, app_role);
      elsif relation.relname <> all (string_to_array(current_setting('app.append_only'), ',')) then
        execute format('grant update on public.%I to %I', relation.relname, app_role);
      end if;
      if relation.relname = any (string_to_array(current_setting('app.may_delete'), ',')) then
        execute format('grant delete on public.%I to %I', relation.relname, app_role);
      end if;
    end loop;
    execute format('grant usage on all sequences in schema public to %I', app_role);
  end $$`;
