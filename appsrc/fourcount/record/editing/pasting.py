"""What a paste was understood as, taken into an outcome in one step."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

from msgspec.structs import replace

from fourcount.record.characters import storable
from fourcount.record.editing.forms import in_form
from fourcount.record.editing.texts import typed_texts
from fourcount.record.outcome import (
    CELLS,
    PAIRED_DESIGNS,
    PAPER_MEASURES,
    EffectOnly,
    Outcome,
    PersonTime,
    RiskAtTime,
    Strata,
    Stratum,
    Table,
)

if TYPE_CHECKING:
    from fourcount.record.entry.readings import Pasted, PastedGroup


def take_paste(outcome: Outcome, pasted: Pasted) -> Outcome:
    """The outcome with the pasted table in place of its own, and with the words and printed figures that were told.

    Words that the paste does not tell stay, and so do all choices, unless it brings another table over one that was
    there. A printed effect without counts joins the counts that are there; where there are none, it is an outcome of
    its own.
    """
    if pasted.form == "effect-only" and typed_texts(outcome):
        return replace(outcome, **_figures(pasted, counts=True))
    if brings_another_table(outcome, pasted):
        outcome = Outcome(design=outcome.design, layout=outcome.layout, where=outcome.where)
    formed = in_form(outcome, pasted.form)
    if pasted.form == "pairs" and formed.design in PAIRED_DESIGNS and _cases_and_controls(pasted):
        formed = replace(formed, design="matched")
    table = _table(formed.table, pasted)
    words = {
        "first_label_text": pasted.groups[0].label if pasted.groups else "",
        "second_label_text": pasted.groups[1].label if len(pasted.groups) > 1 else "",
        "left_heading_text": pasted.left_heading,
        "right_heading_text": pasted.right_heading,
        "left_words_text": pasted.words,
        "span_text": pasted.span,
    }
    told = {field: storable(text) for field, text in words.items() if text}
    layout: dict[str, Any] = {"layout": pasted.layout} if pasted.source == "block" else {}
    figures = _figures(pasted, counts=pasted.form != "effect-only")
    return replace(formed, table=table, **told, **layout, **figures)


def _cases_and_controls(pasted: Pasted) -> bool:
    """Whether the two sides of pasted pairs are a case and its control."""
    sides = {group.label.casefold().rstrip("s") for group in pasted.groups}
    return sides == {"case", "control"}


def brings_another_table(outcome: Outcome, pasted: Pasted) -> bool:
    """Whether counts of other groups, or of another event, come over counts that are there.

    The words, the printed results and the choices of the table that was there then say nothing of the new one.
    """
    told = {
        "first_label_text": pasted.groups[0].label if pasted.groups else "",
        "second_label_text": pasted.groups[1].label if len(pasted.groups) > 1 else "",
        "left_heading_text": pasted.left_heading,
        "left_words_text": pasted.words,
    }
    return bool(typed_texts(outcome)) and any(
        text and text.casefold().strip() != getattr(outcome, field).casefold().strip() for field, text in told.items()
    )


def _table(before: Table, pasted: Pasted) -> Table:
    if isinstance(before, Strata):
        pairs = [pasted.groups[place : place + 2] for place in range(0, len(pasted.groups), 2)]
        labels = (*pasted.stratum_labels, *[""] * len(pairs))
        strata = tuple(
            Stratum(label_text=storable(label), **_cells(pair)) for pair, label in zip(pairs, labels, strict=False)
        )
        return Strata(strata=strata or (Stratum(), Stratum()), of_total=pasted.strata_of_total)
    if isinstance(before, EffectOnly):
        return EffectOnly()
    table = replace(before, **{**dict.fromkeys(CELLS, ""), **_cells(pasted.groups)})
    if isinstance(table, PersonTime) and pasted.unit:
        return replace(table, unit_text=storable(pasted.unit))
    # Limits are of the level that stands beside them; where none does, an earlier paste's must not stay.
    return replace(table, limits_level_text=storable(pasted.limits_level)) if isinstance(table, RiskAtTime) else table


def _cells(groups: tuple[PastedGroup, ...]) -> dict[str, str]:
    texts = [text for group in groups[:2] for text in (group.left_text, group.right_text)]
    return dict(zip(CELLS, map(storable, texts), strict=False))


def _figures(pasted: Pasted, *, counts: bool) -> dict[str, Any]:
    """The printed results. Beside counts, an effect that the print calls adjusted is kept apart from the crude one."""
    if not pasted.paper_text:
        return {}
    text, figures = storable(pasted.paper_text), pasted.figures
    measures = [figure.measure for figure in figures if figure.measure in PAPER_MEASURES]
    apart = counts and bool(figures) and all(figure.adjusted for figure in figures)
    name = "adjusted" if apart else "paper"
    taken: dict[str, Any] = {f"{name}_text": text}
    if measures:
        taken[f"{name}_measure"] = measures[0]
    if pasted.adjusted_for and (apart or not counts):
        taken["adjusted_for_text"] = storable(pasted.adjusted_for)
    return taken
