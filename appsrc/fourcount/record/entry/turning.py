"""The ways in which a doubtful paste can be understood: the same numbers, placed otherwise."""

from __future__ import annotations

from msgspec.structs import replace

from fourcount.record.entry.cell import read_cell
from fourcount.record.entry.readings import Count, Pasted, PastedGroup
from fourcount.record.outcome import Form

OTHER_FORMS: dict[str, dict[Form, Form]] = {
    "others-or-totals": {"events-and-others": "events-of-total", "events-of-total": "events-and-others"},
    "pairs-or-groups": {"pairs": "events-and-others", "events-and-others": "pairs"},
}
"""For a doubt, the forms that its counts may have instead."""

TURNABLE: tuple[Form, ...] = ("events-and-others", "events-of-total", "pairs")

CHOSEN: tuple[Form, ...] = ("events-of-total", "pairs", "person-time")
"""Forms that nobody is in without having chosen them: a bare block of four counts is then of that form."""
FORM_DOUBTS = ("others-or-totals", "pairs-or-groups")


def in_chosen_form(pasted: Pasted, form: Form) -> Pasted:
    """Four bare counts as the form that the reader has chosen before, without the doubts that this settles."""
    if form not in CHOSEN or not set(FORM_DOUBTS) & set(pasted.ambiguous) or len(pasted.groups) != 2:
        return pasted
    doubts = tuple(doubt for doubt in pasted.ambiguous if doubt not in FORM_DOUBTS)
    chosen = _in_form(replace(pasted, ambiguous=doubts), form)
    if chosen is None:
        return pasted
    settled = form == "events-of-total" and len(ways(chosen)) == 1
    doubts = tuple(doubt for doubt in chosen.ambiguous if not (settled and doubt == "orientation"))
    return replace(chosen, ambiguous=doubts)


def ways(pasted: Pasted) -> tuple[Pasted, ...]:
    """Every way, the one that was taken first; only that one where no doubt has another."""
    upright = (pasted, *_other_forms(pasted))
    if "orientation" not in pasted.ambiguous or pasted.form not in TURNABLE or len(pasted.groups) != 2:
        return upright
    turned = (_transposed(way) for way in upright if way.form in TURNABLE)
    return (*upright, *(way for way in turned if _possible(way)))


def _other_forms(pasted: Pasted) -> tuple[Pasted, ...]:
    others = [
        _in_form(pasted, forms[pasted.form])
        for doubt, forms in OTHER_FORMS.items()
        if doubt in pasted.ambiguous and pasted.form in forms
    ]
    return tuple(way for way in others if way)


def _in_form(pasted: Pasted, form: Form) -> Pasted | None:
    """The same counts in another form; totals that stand first change places. None where neither can be."""
    straight = replace(pasted, form=form)
    if _possible(straight):
        return straight
    groups = tuple(replace(each, left_text=each.right_text, right_text=each.left_text) for each in pasted.groups)
    headings = pasted.right_heading, pasted.left_heading
    swapped = replace(straight, groups=groups, left_heading=headings[0], right_heading=headings[1])
    return swapped if _possible(swapped) else None


def _possible(pasted: Pasted) -> bool:
    """Whether events fit into their totals, where totals are what stands beside them."""
    if pasted.form != "events-of-total":
        return True
    for group in pasted.groups:
        events, total = read_cell(group.left_text), read_cell(group.right_text)
        if isinstance(events, Count) and isinstance(total, Count) and events.value > total.value:
            return False
    return True


def _transposed(pasted: Pasted) -> Pasted:
    """Rows become columns; the names of the groups change places with those of the outcomes."""
    first, second = pasted.groups
    groups = (
        PastedGroup(left_text=first.left_text, right_text=second.left_text, label=pasted.left_heading),
        PastedGroup(left_text=first.right_text, right_text=second.right_text, label=pasted.right_heading),
    )
    return replace(
        pasted,
        groups=groups,
        left_heading=first.label,
        right_heading=second.label,
        layout="across" if pasted.layout == "down" else "down",
    )
