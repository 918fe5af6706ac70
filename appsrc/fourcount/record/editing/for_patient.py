"""What can be chosen of the patient, the reader's own line and the page for a patient."""

from __future__ import annotations

from msgspec.structs import replace

from fourcount.record.editing.texts import one_of
from fourcount.record.outcome import (
    CERTAINTIES,
    EFFECTS,
    LINE_KINDS,
    LINE_SCALES,
    LINE_SIDES,
    START_KINDS,
    Certainty,
    Effect,
    LineKind,
    LineScale,
    LineSide,
    Outcome,
    StartKind,
)


def with_effect(outcome: Outcome, effect: Effect) -> Outcome:
    """Choose the effect that is carried to the patient."""
    return replace(outcome, patient=replace(outcome.patient, effect=one_of(effect, EFFECTS)))


def with_start_kind(outcome: Outcome, kind: StartKind) -> Outcome:
    """Choose how the starting risk is given; what was typed for another way stays."""
    return replace(outcome, patient=replace(outcome.patient, start_kind=one_of(kind, START_KINDS)))


def with_line_kind(outcome: Outcome, kind: LineKind) -> Outcome:
    """Say whether the reader's own line is a margin or the smallest difference that would matter; "none" hides it.

    While nothing is typed the line goes to the side where such a line mostly lies: a margin to the worse one, what
    would matter to the better one.
    """
    outcome = replace(outcome, line_kind=one_of(kind, LINE_KINDS))
    if kind == "none" or outcome.line_text.strip():
        return outcome
    return replace(outcome, line_side="more" if outcome.welcome == (kind == "matters") else "fewer")


def with_line_scale(outcome: Outcome, scale: LineScale) -> Outcome:
    """Choose the measure on whose scale the line is typed."""
    return replace(outcome, line_scale=one_of(scale, LINE_SCALES))


def with_line_side(outcome: Outcome, side: LineSide) -> Outcome:
    """Say on which side of no effect the line lies."""
    return replace(outcome, line_side=one_of(side, LINE_SIDES))


def with_certainty(outcome: Outcome, certainty: Certainty) -> Outcome:
    """Rate the certainty of the evidence; empty for not rated."""
    return replace(outcome, certainty=one_of(certainty, CERTAINTIES))


def with_on_handout(outcome: Outcome, shown: bool) -> Outcome:
    """Say whether the outcome stands on the page for the patient."""
    return replace(outcome, on_handout=bool(shown))


def line_turned(outcome: Outcome) -> Outcome:
    """The line on the other side, as fewer falls are more people without one, or fewer in the other group.

    So a difference stays the same line. A ratio's number, and a difference with a word or sign of its own, then lie on
    another side than the one chosen, and are marked: what was typed is never changed.
    """
    if not outcome.line_text.strip():
        return outcome
    return replace(outcome, line_side="more" if outcome.line_side == "fewer" else "fewer")
