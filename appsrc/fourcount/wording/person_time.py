"""How person-time is said: its unit as typed, and for how many units a rate is told."""

from __future__ import annotations

import re

from fourcount.appraisal.findings import Rates
from fourcount.record.entry.person_time import read_person_time
from fourcount.record.outcome import Outcome, PersonTime
from fourcount.wording import names, numbers

UNIT_STAND_IN = "units of person-time"
SINGULAR = re.compile(r"(year|month|week|day|hour|quarter|unit)$", re.IGNORECASE)
PLURAL = re.compile(r"(year|month|week|day|hour|quarter|unit)s\b", re.IGNORECASE)
POWERS = (1, 100, 1_000, 10_000, 100_000, 1_000_000, 10_000_000, 100_000_000, 1_000_000_000)


def unit(outcome: Outcome) -> str:
    """The unit of person-time as it is read, in the plural: "person-years"."""
    typed = names.bare(read_person_time(outcome.table).unit) if isinstance(outcome.table, PersonTime) else ""
    return SINGULAR.sub(r"\1s", typed) or UNIT_STAND_IN


def per_units(rates: Rates) -> int:
    """The power of ten of units at which the smaller rate that is not 0 comes to one event at least.

    Rates are told as whole as that, so that both read without leading zeros; where nobody had an event, as if one had.
    """
    groups = ((rates.index_events, rates.index_time), (rates.reference_events, rates.reference_time))
    timed = [(events, time) for events, time in groups if time > 0]
    if not timed:
        return 1
    least = min((events / time for events, time in timed if events), default=1 / max(time for _, time in timed))
    return next((power for power in POWERS if least * power >= 1), POWERS[-1])


def unit_sum(per: int, outcome: Outcome) -> str:
    """``1,000 person-years``; of one unit ``person-year``."""
    return PLURAL.sub(r"\1", unit(outcome), count=1) if per == 1 else f"{numbers.whole(per)} {unit(outcome)}"


def time_in(time: float, outcome: Outcome) -> str:
    """``4,120 person-years``."""
    return f"{numbers.quantity(time)} {unit(outcome)}"
