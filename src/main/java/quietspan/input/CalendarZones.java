package quietspan.input;

import java.util.Map;

/** The zones that a calendar file defines, by TZID. */
record CalendarZones(Map<String, CalendarZone> byId) {

  CalendarZones {
    byId = Map.copyOf(byId);
  }

  CalendarZone zone(String tzid) throws Refusal {
    CalendarZone zone = byId.get(tzid);
    if (zone == null) {
      throw new Refusal(
          "the zone " + Refusal.quoted(tzid) + " has no VTIMEZONE in this file",
          "a VTIMEZONE for it (RFC 5545, 3.2.19), or times with Z");
    }
    return zone;
  }
}
