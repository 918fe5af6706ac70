"""Everything typed of the risk that a patient starts from, as far as the chosen way of giving it uses it."""

from __future__ import annotations

from collections.abc import Mapping

import msgspec

from fourcount.record.entry.digits import specimen
from fourcount.record.entry.person_rate import read_rate
from fourcount.record.entry.readings import Blank, Mark, Proportion, RateReading, RiskReading, Unreadable
from fourcount.record.entry.risk import read_risk
from fourcount.record.entry.starting import read_share, read_starting_risk
from fourcount.record.outcome import Patient

Reading = RiskReading | Proportion | RateReading | Blank | Unreadable


class StartReading(msgspec.Struct, frozen=True, kw_only=True):
    """The fields of one way of giving a starting risk; those of the other ways are blank.

    ``usual`` is the one risk, or the usual one of three. A low risk above the usual one, or a high one below it, is
    unreadable; without a usual one both are, where the low one is above the high one. ``marks`` are those of all
    fields read, and those of a risk or a share of 0 or 1, which is used.
    """

    usual: RiskReading | Blank | Unreadable = Blank()
    low: Proportion | Blank | Unreadable = Blank()
    high: Proportion | Blank | Unreadable = Blank()
    rate: RateReading | Blank | Unreadable = Blank()
    overall: Proportion | Blank | Unreadable = Blank()
    share: Proportion | Blank | Unreadable = Blank()
    marks: tuple[Mark, ...] = ()


def read_start(patient: Patient) -> StartReading:
    """What the fields of the chosen kind hold, each read once."""
    if patient.start_kind == "rate":
        rate = read_rate(patient.rate_text)
        return StartReading(rate=rate, marks=_marks(patient, {"rate_text": rate}))
    if patient.start_kind == "overall":
        overall, share = read_risk(patient.overall_risk_text), read_share(patient.exposed_share_text)
        marks = _marks(patient, {"overall_risk_text": overall, "exposed_share_text": share})
        return StartReading(overall=overall, share=share, marks=marks)
    usual = read_starting_risk(patient.starting_risk_text)
    if patient.start_kind == "one":
        return StartReading(usual=usual, marks=_marks(patient, {"starting_risk_text": usual}))
    low, high = _in_order(patient, usual)
    marks = _marks(patient, {"low_risk_text": low, "starting_risk_text": usual, "high_risk_text": high})
    return StartReading(usual=usual, low=low, high=high, marks=marks)


def _in_order(
    patient: Patient, usual: RiskReading | Blank | Unreadable
) -> tuple[Proportion | Blank | Unreadable, Proportion | Blank | Unreadable]:
    """The low and the high risk, unreadable where they lie on the wrong side of the usual one.

    Where there is no usual one to tell which of the two is wrong, neither is used.
    """
    low, high = read_risk(patient.low_risk_text), read_risk(patient.high_risk_text)
    if not isinstance(usual, RiskReading):
        if isinstance(low, Proportion) and isinstance(high, Proportion) and low.value > high.value:
            return (
                _wrong("low-above-high", patient.low_risk_text),
                _wrong("high-below-low", patient.high_risk_text),
            )
        return low, high
    if isinstance(low, Proportion) and low.value > usual.value:
        low = _wrong("low-above-usual", patient.low_risk_text)
    if isinstance(high, Proportion) and high.value < usual.value:
        high = _wrong("high-below-usual", patient.high_risk_text)
    return low, high


def _marks(patient: Patient, read: Mapping[str, Reading]) -> tuple[Mark, ...]:
    """A mark for what cannot be used, for a risk that no ratio moves, and for a share of nobody or of everybody."""
    found = []
    for field, reading in read.items():
        if isinstance(reading, Unreadable):
            found.append(Mark(field=field, key=reading.key, facts=reading.facts))
        elif isinstance(reading, RiskReading | Proportion):
            what = "share" if field == "exposed_share_text" else "risk"
            key = {0.0: f"{what}-of-nobody", 1.0: f"{what}-of-everybody"}.get(reading.value)
            facts: dict[str, str | int | float] = {"text": specimen(getattr(patient, field))}
            found += [Mark(field=field, key=key, facts=facts, used=True)] if key else []
    return tuple(found)


def _wrong(key: str, text: str) -> Unreadable:
    return Unreadable(key=key, facts={"text": specimen(text)})
