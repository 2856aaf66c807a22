/**
 * What follows from a scenario alone, before anything is planned: where contacts could run ({@link
 * quietspan.rules.Opportunities}) and which limits no plan could keep ({@link
 * quietspan.rules.Waivers}).
 */
package quietspan.rules;
