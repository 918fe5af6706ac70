"""Time spans as they are said: one form for every way in which the same span can be typed."""

from __future__ import annotations

from functools import lru_cache

from fourcount.record.entry.duration import NO_TIME, read_duration
from fourcount.record.entry.readings import Duration, Unreadable
from fourcount.wording import numbers

REMEMBERED = 64
"""Spans typed lately; one sentence after another asks for the same one."""


def duration(span: Duration) -> str:
    """``12 months``, ``1 year``."""
    return f"{numbers.quantity(span.value)} {span.unit}{'' if span.value == 1 else 's'}"


@lru_cache(maxsize=REMEMBERED)
def span_said(typed: str) -> str:
    """``30 days`` of "30-day" and "over 30 d"; what is no time is left out, and other words stay ("median 2 years")."""
    reading = read_duration(typed)
    if isinstance(reading, Duration):
        return duration(reading)
    return "" if isinstance(reading, Unreadable) and reading.key in NO_TIME else typed
