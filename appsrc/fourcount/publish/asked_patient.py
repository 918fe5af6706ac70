"""What is asked for a patient, and of a line of one's own, by name: checked, and as a reader would have typed it."""

from __future__ import annotations

import re
from collections.abc import Iterable, Mapping
from dataclasses import dataclass, fields
from decimal import Decimal
from numbers import Real
from typing import cast

import msgspec

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.carrying.effects import named
from fourcount.publish.shown import shown
from fourcount.record.entry.duration import read_duration
from fourcount.record.entry.margin import read_margin
from fourcount.record.entry.readings import Blank, Mark, Unreadable
from fourcount.record.entry.starts import read_start
from fourcount.record.outcome import EFFECTS, Effect, LineScale, LineSide, Outcome, Patient, StartKind
from fourcount.record.paper import Choices
from fourcount.wording import command as words
from fourcount.wording.gaps import mark_text

SCALES: Mapping[str, LineScale] = {
    "RD": "risk_difference",
    "RR": "risk_ratio",
    "OR": "odds_ratio",
    "HR": "hazard_ratio",
}
_NAMED = re.compile(r"\s*(RD|RR|OR|HR)\b[\s=:]*(.*)", re.IGNORECASE | re.DOTALL)
_WITH_UNIT = re.compile(r"%|\b(?:per|in|of|points?|pp|fewer|more|less)\b", re.IGNORECASE)


@dataclass(frozen=True, kw_only=True, slots=True)
class Wishes:
    """The options of a patient by name; None where one is not given."""

    baseline: object = None
    low: object = None
    high: object = None
    rate: object = None
    overall: object = None
    exposed: object = None
    effect: object = None
    span: object = None
    other_span: object = None
    adjusted: object = None
    margin: object = None
    matters: object = None

    def given(self) -> frozenset[str]:
        """The names of those that are given."""
        return frozenset(field.name for field in fields(self) if getattr(self, field.name) is not None)


WISHES = tuple(field.name for field in fields(Wishes))
"""The names of all options of a patient and of a line of one's own."""


def with_wishes(outcome: Outcome, wishes: Wishes) -> Outcome:
    """The outcome with all that is asked; ValueError with one plain sentence where a part cannot be used."""
    patient = Patient(
        starting_risk_text=_risk_text("baseline", wishes.baseline),
        low_risk_text=_risk_text("low", wishes.low),
        high_risk_text=_risk_text("high", wishes.high),
        overall_risk_text=_risk_text("overall", wishes.overall),
        exposed_share_text=_risk_text("exposed", wishes.exposed),
        rate_text=_text("rate", wishes.rate),
        other_span_text=_span("other span", wishes.other_span),
        start_kind=_start_kind(wishes.given()),
        effect=_effect(wishes.effect),
    )
    _check(read_start(patient).marks)
    found = msgspec.structs.replace(
        outcome,
        patient=patient,
        span_text=_span("span", wishes.span),
        adjusted_text=_adjusted(wishes.adjusted, outcome),
    )
    return _with_line(found, wishes)


def _start_kind(given: frozenset[str]) -> StartKind:
    """How the starting risk is given; ways that exclude each other, and half of one, are refused."""
    if "rate" in given and given & {"baseline", "low", "high", "overall", "exposed"}:
        raise ValueError(words.ONE_START)
    if given & {"overall", "exposed"}:
        if given & {"baseline", "low", "high"}:
            raise ValueError(words.ONE_START)
        if not {"overall", "exposed"} <= given:
            raise ValueError(words.OVERALL_AND_SHARE)
        return "overall"
    if "rate" in given:
        return "rate"
    return "three" if given & {"low", "high"} else "one"


def _check(marks: Iterable[Mark]) -> None:
    """Refuse what a reader would have had marked in a patient's fields. A risk of 0 or 100% is used."""
    for mark in marks:
        if not mark.used and mark.field in words.FIELDS:
            raise ValueError(words.UNUSABLE.format(name=words.FIELDS[mark.field], reason=mark_text(mark)))


def _risk_text(name: str, value: object) -> str:
    """A risk as a reader would type it; a fraction is written so that it reads back as the same number."""
    if value is None:
        return ""
    if isinstance(value, str):
        if not value.strip():
            raise ValueError(words.NO_RISK.format(name=name))
        return value
    usable = isinstance(value, Real) and not isinstance(value, bool)
    if not usable or not 0 <= cast(float, value) <= 1:
        raise ValueError(words.NOT_A_RISK.format(name=name, given=shown(value)))
    return f"{Decimal(repr(float(cast(float, value)))).scaleb(2):f}%"


def _text(name: str, value: object) -> str:
    if value is None:
        return ""
    if not isinstance(value, str) or not value.strip():
        raise ValueError(words.NOT_A_TEXT.format(name=_named(name), example=words.EXAMPLES[name], given=shown(value)))
    return value


def _named(name: str) -> str:
    """What a sentence calls an option."""
    return words.NAMES.get(name, name)


def _span(name: str, value: object) -> str:
    text = _text(name, value)
    reading = read_duration(text)
    if isinstance(reading, Unreadable):
        raise ValueError(words.UNUSABLE.format(name=name, reason=mark_text(reading)))
    return text


def _effect(value: object) -> Effect:
    if value is None:
        return "usual"
    for effect in EFFECTS:
        if isinstance(value, str) and value.replace("-", "_") == effect:
            return effect
    raise ValueError(words.ONE_OF.format(name="effect", allowed=", ".join(EFFECTS), given=shown(value)))


def check_against_study(wishes: Wishes, outcome: Outcome, choices: Choices) -> None:
    """Refuse what these counts do not have: a risk on the wrong side of the study's own, and an effect.

    A reader's choice of effect stays while the table changes under it, and gives way to the usual one for that time;
    a question that names an effect wants that one. Where nothing can be carried, the patient's place says why.
    """
    if not wishes.given() & {"low", "high", "effect"}:
        return
    findings = appraise(outcome, choices, deferring=True)
    _check(findings.marks)
    carriable = findings.carriable
    if wishes.effect is not None and carriable and named(carriable, outcome.patient.effect) is None:
        allowed = dict.fromkeys("adjusted" if one.adjusted else one.effect for one in carriable)
        raise ValueError(words.NOT_CARRIED.format(given=shown(wishes.effect), allowed=", ".join(allowed)))


def _adjusted(value: object, outcome: Outcome) -> str:
    """The adjusted effect as printed; one that cannot be read is refused."""
    from fourcount.appraisal.extras.printed import read_effect

    text = _text("adjusted", value)
    if text and read_effect(text, outcome.adjusted_measure, "adjusted_text").figure is None:
        raise ValueError(
            words.NOT_A_TEXT.format(name=_named("adjusted"), example=words.EXAMPLES["adjusted"], given=shown(value))
        )
    return text


def _with_line(outcome: Outcome, wishes: Wishes) -> Outcome:
    """The outcome with a margin or the smallest difference that matters, on the scale and the side that it names.

    Where it names no side, a margin is on the worse one and a difference that matters on the better one.
    """
    if wishes.margin is not None and wishes.matters is not None:
        raise ValueError(words.ONE_LINE)
    name = "matters" if wishes.margin is None else "margin"
    text = _text(name, getattr(wishes, name))
    if not text:
        return outcome
    scale, bare = _scale(name, text)
    more_first = (name == "margin") != outcome.welcome
    sides: tuple[LineSide, ...] = ("more", "fewer") if more_first else ("fewer", "more")
    readings = [(side, read_margin(bare, scale, side)) for side in sides]
    side = next((side for side, reading in readings if isinstance(reading, float)), None)
    if side is None:
        reading = readings[0][1]
        reason = mark_text(reading) if isinstance(reading, Unreadable) else words.EXAMPLES[name]
        raise ValueError(words.UNUSABLE.format(name=_named(name), reason=reason))
    return msgspec.structs.replace(
        outcome,
        line_kind="margin" if name == "margin" else "matters",
        line_scale=scale,
        line_side=side,
        line_text=bare,
    )


def _scale(name: str, text: str) -> tuple[LineScale, str]:
    """The scale by its name, or a difference by its unit; a bare number could be of any scale."""
    match = _NAMED.fullmatch(text)
    if match:
        return SCALES[match[1].upper()], match[2]
    if not _WITH_UNIT.search(text) or isinstance(read_margin(text, "risk_difference", "more"), Blank):
        raise ValueError(words.NOT_A_TEXT.format(name=_named(name), example=words.EXAMPLES[name], given=shown(text)))
    return "risk_difference", text
