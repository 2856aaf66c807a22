// Reads the calendar files named on the command line with ical.js and prints what it saw as JSON.
import { readFileSync } from "node:fs";
import ICAL from "ical.js";

const calendars = process.argv.slice(2).map((path) => {
  const calendar = new ICAL.Component(ICAL.parse(readFileSync(path, "utf8")));
  const text = (name) => calendar.getFirstPropertyValue(name) ?? null;
  return {
    name: text("name"),
    oldName: text("x-wr-calname"),
    refresh: String(text("refresh-interval")),
    method: text("method"),
    events: calendar.getAllSubcomponents("vevent").map((component) => {
      const event = new ICAL.Event(component);
      return {
        uid: event.uid,
        begin: event.startDate.toJSDate().toISOString(),
        end: event.endDate.toJSDate().toISOString(),
        stamp: component.getFirstPropertyValue("dtstamp").toJSDate().toISOString(),
        title: event.summary,
        description: event.description,
        category: component.getFirstPropertyValue("categories"),
        status: component.getFirstPropertyValue("status"),
        sequence: event.sequence,
        transparency: component.getFirstPropertyValue("transp"),
        organizer: event.organizer ?? null,
      };
    }),
  };
});
process.stdout.write(JSON.stringify(calendars));
