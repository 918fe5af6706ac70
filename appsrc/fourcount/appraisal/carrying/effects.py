"""The effects that an outcome can carry to a patient, the usual one first."""

from __future__ import annotations

from collections.abc import Iterable
from typing import cast

from fourcount.appraisal.extras.printed import ReadEffect, as_figure, level_of
from fourcount.appraisal.findings import Carriable, CarriedEffect, Figure, Gap, PrintedFigure
from fourcount.appraisal.gating import OBSERVATIONAL, withheld_of_effects
from fourcount.appraisal.turning import oriented_effect
from fourcount.record.outcome import Design, Effect, Outcome

ADJUSTED_FIRST: tuple[Design, ...] = (*OBSERVATIONAL, "before-after")
"""The designs that do not make their groups alike: there the adjusted effect is the usual one."""

NOT_CARRIED = ("rate_difference",)
"""Printed effects that no risk follows from."""


def carriable_of(outcome: Outcome, crude: Iterable[Carriable], adjusted: ReadEffect) -> tuple[Carriable, ...]:
    """The form's own effects in their order, and the printed adjusted one: first outside trials, last in one."""
    own, printed = tuple(crude), _adjusted(outcome, adjusted)
    if printed is None:
        return own
    return (printed, *own) if outcome.design in ADJUSTED_FIRST else (*own, printed)


def named(carriable: tuple[Carriable, ...], effect: Effect) -> Carriable | None:
    """The effect of that name; None where it is not there."""
    if effect == "usual":
        return carriable[0] if carriable else None
    for one in carriable:
        if one.adjusted if effect == "adjusted" else one.effect == effect and not one.adjusted:
            return one
    return None


def chosen(carriable: tuple[Carriable, ...], effect: Effect) -> Carriable | None:
    """The effect that is asked for; the usual one where that is not there."""
    return named(carriable, effect) or named(carriable, "usual")


def of_print(printed: PrintedFigure, figure: Figure, outcome: Outcome, *, adjusted: bool) -> Carriable | None:
    """A printed effect of the index group and the counted outcome; None where no risk follows from it."""
    if printed.measure in NOT_CARRIED or printed.measure in withheld_of_effects(outcome.design):
        return None
    return Carriable(
        effect=cast("CarriedEffect", printed.measure),
        measure=printed.measure,
        figure=figure,
        adjusted=adjusted,
        adjusted_for=" ".join(outcome.adjusted_for_text.split()),
        level=level_of(printed),
    )


def _adjusted(outcome: Outcome, adjusted: ReadEffect) -> Carriable | None:
    """The adjusted effect beside the counts, which is of the print's first group and left outcome as they stand."""
    printed = adjusted.figure
    figure = None if printed is None else as_figure(printed)
    if printed is None or figure is None or isinstance(figure, Gap):
        return None
    turned = oriented_effect(figure, printed.measure, outcome)
    return None if isinstance(turned, Gap) else of_print(printed, turned, outcome, adjusted=True)
