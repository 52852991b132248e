import { inTransaction, type Migration } from '@/server/migrate';

/** One index for each order a search may ask for, with the system in front and for the whole catalogue. */
export const up: Migration = inTransaction(`
  create index orbit_by_period on orbit (system_id, period, number);
  create index orbit_by_returns on orbit (system_id, returns, number);
  create index orbit_by_multiplier on orbit (system_id, unstable_multiplier, number);
  create index orbit_by_time on orbit (system_id, accepted_at, number);
  create index orbit_by_number on orbit (system_id, number);
  create index orbit_by_itinerary on orbit (system_id, itinerary, number);
  create index orbit_by_flow on orbit (system_id, parameters_hash, period);
  create index orbit_by_section on orbit (system_id, section_id, returns);
  create index orbit_of_all_by_period on orbit (period, number);
  create index orbit_of_all_by_returns on orbit (returns, number);
  create index orbit_of_all_by_multiplier on orbit (unstable_multiplier, number);
  create index orbit_of_all_by_time on orbit (accepted_at, number);
  create index orbit_by_words on orbit using gin (search_text gin_trgm_ops);
  create index orbit_by_parameter_value on orbit using gin (parameter_values jsonb_path_ops);
`);

export const down: Migration = inTransaction(`
  drop index orbit_by_period, orbit_by_returns, orbit_by_multiplier, orbit_by_time, orbit_by_number, orbit_by_itinerary,
    orbit_by_flow, orbit_by_section, orbit_of_all_by_period, orbit_of_all_by_returns, orbit_of_all_by_multiplier,
    orbit_of_all_by_time, orbit_by_words, orbit_by_parameter_value;
`);
