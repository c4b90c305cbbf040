"""Reads a calendar file with Debian's python3-icalendar and prints its events as JSON."""
import json
import sys
from icalendar import Calendar

calendar = Calendar.from_ical(sys.stdin.buffer.read())
events = []
for event in calendar.walk("VEVENT"):
    start = event["DTSTART"].dt
    events.append(
        {
            "uid": str(event["UID"]),
            "start": start.isoformat(),
            "end": event["DTEND"].dt.isoformat() if "DTEND" in event else None,
            "stamp": event["DTSTAMP"].dt.isoformat(),
            "summary": str(event["SUMMARY"]),
            "description": str(event["DESCRIPTION"]),
            "alarms": [str(alarm["TRIGGER"].dt) for alarm in event.walk("VALARM")],
        }
    )
json.dump({"name": str(calendar["X-WR-CALNAME"]), "errors": [str(e) for c in calendar.walk() for e in c.errors], "events": events}, sys.stdout)
