"""A whole table in each form of print that has four cells."""

from __future__ import annotations

from fourcount.record.outcome import Form

TYPED: dict[Form, tuple[str, str, str, str]] = {
    "events-and-others": ("38", "374", "70", "339"),
    "events-of-total": ("38", "412", "70", "409"),
    "percent-of-total": ("9.2%", "412", "17.1%", "409"),
    "pairs": ("12", "21", "9", "58"),
    "person-time": ("38", "4120", "70", "3980"),
    "risk-at-time": ("9%", "6 to 12", "17%", "13 to 21"),
}
