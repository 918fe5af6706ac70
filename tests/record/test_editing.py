"""What a hand can do to a record: one thing at a time, and nothing else moves."""

from __future__ import annotations

from typing import Any, get_args

import msgspec
import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record import editing
from fourcount.record.characters import UNHELD
from fourcount.record.entry.readings import Proportion
from fourcount.record.entry.risk import read_risk
from fourcount.record.entry.table import read_table
from fourcount.record.outcome import (
    CELLS,
    DESIGNS,
    PAPER_MEASURES,
    WHERE,
    Counting,
    Effect,
    EventsAndOthers,
    EventsOfTotal,
    Layout,
    Outcome,
    Patient,
)
from fourcount.record.paper import FAMILIES, Choices, Record

TABLE = EventsAndOthers(first_left_text="38", first_right_text="1,374", second_left_text="70", second_right_text="338*")
OUTCOME = Outcome(
    name_text="Falls",
    table=TABLE,
    design="cohort",
    first_label_text="night lights",
    second_label_text="usual care",
    left_heading_text="fell",
    right_heading_text="did not fall",
    left_words_text="fell at least once",
    right_words_text="did not fall",
    span_text="12 months",
    patient=Patient(starting_risk_text="12%", starting_risk_source_text="ward audit", effect="odds_ratio"),
)
RECORD = Record(title_text="Lights", source_text="Table 2", outcomes=(OUTCOME, Outcome()), choices=Choices())
TEXT_FIELDS = sorted({*CELLS, *editing.OUTCOME_TEXTS, *editing.PATIENT_TEXTS})

ACTIONS: dict[str, tuple[Any, set[str]]] = {
    "swap": (editing.swap_groups, {"index_group"}),
    "count": (editing.count_other_outcome, {"counted", "patient"}),
    "form": (lambda outcome: editing.in_form(outcome, "events-of-total"), {"table"}),
    "clear": (editing.clear_table, {"table"}),
    "design": (lambda outcome: editing.with_design(outcome, "survey"), {"design"}),
    "welcome": (lambda outcome: editing.with_welcome(outcome, welcome=True), {"left_welcome"}),
    "layout": (lambda outcome: editing.with_layout(outcome, "across"), {"layout"}),
    "effect": (lambda outcome: editing.with_effect(outcome, "risk_ratio"), {"patient"}),
    "counting": (lambda outcome: editing.with_counting(outcome, "events"), {"counting"}),
    "varied": (lambda outcome: editing.with_follow_up_varied(outcome, varied=True), {"follow_up_varied"}),
    "where": (lambda outcome: editing.with_where(outcome, "abstract"), {"where"}),
    "paper": (lambda outcome: editing.with_paper_measure(outcome, "hazard_ratio"), {"paper_measure"}),
    "start": (lambda outcome: editing.with_start_kind(outcome, "three"), {"patient"}),
    "line": (lambda outcome: editing.with_line_kind(outcome, "margin"), {"line_kind", "line_side"}),
    "scale": (lambda outcome: editing.with_line_scale(outcome, "odds_ratio"), {"line_scale"}),
    "side": (lambda outcome: editing.with_line_side(outcome, "more"), {"line_side"}),
    "certainty": (lambda outcome: editing.with_certainty(outcome, "very-low"), {"certainty"}),
    "page": (lambda outcome: editing.with_on_handout(outcome, shown=False), {"on_handout"}),
    "adjusted": (lambda outcome: editing.with_adjusted_measure(outcome, "hazard_ratio"), {"adjusted_measure"}),
}


def changed(before: Any, after: Any) -> set[str]:
    """The names of the fields that differ."""
    return {name for name in before.__struct_fields__ if getattr(before, name) != getattr(after, name)}


@pytest.mark.parametrize("name", ACTIONS)
def test_an_action_changes_one_thing(name: str) -> None:
    """Each action changes its own field and keeps every other."""
    action, fields = ACTIONS[name]
    assert changed(OUTCOME, action(OUTCOME)) == fields


@pytest.mark.parametrize("name", ACTIONS)
def test_an_action_leaves_the_earlier_outcome_for_undo(name: str) -> None:
    """The outcome before an action is untouched, so showing it again undoes the action."""
    before = msgspec.json.encode(OUTCOME)
    ACTIONS[name][0](OUTCOME)
    assert msgspec.json.encode(OUTCOME) == before


@pytest.mark.parametrize("field", TEXT_FIELDS)
def test_text_is_written_where_it_belongs(field: str) -> None:
    """Each text field of outcome, table and patient takes its text, and no other changes."""
    edited = editing.edit_text(OUTCOME, field, "new")
    home = "table" if field in CELLS else "patient" if field in editing.PATIENT_TEXTS else None
    holder = edited if home is None else getattr(edited, home)
    assert getattr(holder, field) == "new"
    assert changed(OUTCOME, edited) == {home or field}
    if home is not None:
        assert changed(getattr(OUTCOME, home), holder) == {field}


def test_every_text_of_the_record_can_be_edited() -> None:
    """The paper's own texts are edited beside the outcomes."""
    for field in editing.RECORD_TEXTS:
        edited = editing.edit_record_text(RECORD, field, "new")
        assert getattr(edited, field) == "new"
        assert changed(RECORD, edited) == {field}


@pytest.mark.parametrize("field", ["design", "table", "", "title_text", "no_such_text"])
def test_only_text_fields_take_text(field: str) -> None:
    """A field that is no text of an outcome is refused."""
    with pytest.raises(ValueError, match="none of the possible"):
        editing.edit_text(OUTCOME, field, "new")


@given(st.text(st.characters(exclude_categories=("Cc", "Cs", "Cf"))))
def test_text_stays_as_it_was_typed(text: str) -> None:
    """Whatever can be seen is kept as it is."""
    assert editing.edit_text(OUTCOME, "name_text", text).name_text == text


@given(st.text(st.characters(exclude_categories=())))
def test_any_text_can_be_kept_and_saved(text: str) -> None:
    """What no file holds becomes the mark of a missing character in place; all else stays, and twice is once."""
    kept = editing.edit_text(OUTCOME, "name_text", text).name_text
    kept.encode()
    assert not UNHELD.search(kept)
    assert editing.edit_text(OUTCOME, "name_text", kept).name_text == kept
    whole = text.encode("utf-16-le", "surrogatepass").decode("utf-16-le", "replace")
    assert len(kept) == len(whole)
    assert all(one in (other, " ", "\ufffd") for one, other in zip(kept, whole, strict=True))


@pytest.mark.parametrize(
    ("typed", "kept"),
    [
        ("a\ud800b", "a\ufffdb"),
        ("a\ud83d\ude00b", "a\U0001f600b"),
        ("38\x0c", "38 "),
        ("a\u202e12", "a\ufffd12"),
        ("a\x00b", "a\ufffdb"),
        ("a\tb\nc", "a\tb\nc"),
        ("\u0663\u200f\u05d0", "\u0663\u200f\u05d0"),
        ("9" * 10_000, "9" * 10_000),
    ],
)
def test_what_no_file_holds_is_seen_to_be_missing(typed: str, kept: str) -> None:
    """Halves of a character, controls and overrides of direction are shown as missing; long text is not cut."""
    assert editing.edit_text(OUTCOME, "first_left_text", typed).table.first_left_text == kept


def test_swapping_twice_is_nothing() -> None:
    """Two swaps, or counting the other outcome twice, give the outcome back."""
    assert editing.swap_groups(editing.swap_groups(OUTCOME)) == OUTCOME
    assert editing.count_other_outcome(editing.count_other_outcome(OUTCOME)) == OUTCOME


@pytest.mark.parametrize(
    ("typed", "turned"),
    [
        ("70%", "30%"),
        ("12.50 %", "87.50 %"),
        ("12,5 per cent", "87,5 per cent"),
        ("99.9%", "0.1%"),
        (".5%", "99.5%"),
        ("0,125%", "99.875%"),
        ("12", "88"),
        ("99.5", "0.5%"),
        ("99", "1%"),
        ("0", "100"),
        ("100%", "0%"),
        ("12 in 100", "88 in 100"),
        ("12/100", "88/100"),
        ("12 out of 100", "88 out of 100"),
        ("1 in 1,000", "999 in 1,000"),
        ("1 in 10 000", "9 999 in 10 000"),
        ("8,796 in 10,000", "1,204 in 10,000"),
        ("1.5 in 1,000", "998.5 in 1,000"),
        ("0,5 in 100", "99,5 in 100"),
        ("9,500 in 10 000", "500 in 10 000"),
        ("0,500 in 10", "9.500 in 10"),
        ("0/5", "5/5"),
        ("often", "often"),
        ("0.12", "0.12"),
        ("120%", "120%"),
        (" ", " "),
        ("", ""),
    ],
)
def test_a_starting_risk_is_turned_with_the_outcome_that_it_is_of(typed: str, turned: str) -> None:
    """Of 70% who heal, 30% do not, in the same style; text that gives no risk stays as it is."""
    outcome = Outcome(patient=Patient(starting_risk_text=typed, starting_risk_source_text="audit", effect="odds_ratio"))
    there = editing.count_other_outcome(outcome)
    assert there.patient == Patient(starting_risk_text=turned, starting_risk_source_text="audit", effect="odds_ratio")
    assert read_risk(editing.count_other_outcome(there).patient.starting_risk_text) == read_risk(typed)


NUMBERS = st.integers(0, 10**6).map(str) | st.decimals(0, 100, places=3, allow_nan=False).map(str)
RISKS = st.tuples(
    NUMBERS,
    st.sampled_from(("", "%", " %", " per cent", " in 100", "/1,000", " of 10 000", " per 1000000")),
    st.sampled_from((".", ",", "\u00b7")),
).map(lambda parts: parts[0].replace(".", parts[2]) + parts[1])


@given(RISKS)
def test_counting_the_other_outcome_twice_gives_an_equal_risk(text: str) -> None:
    """Whatever can be read, the two risks make a whole, and the way back leads to where it began."""
    there = editing.count_other_outcome(Outcome(patient=Patient(starting_risk_text=text)))
    back = editing.count_other_outcome(there)
    reading, turned = read_risk(text), read_risk(there.patient.starting_risk_text)
    if isinstance(reading, Proportion):
        assert isinstance(turned, Proportion)
        assert reading.value + turned.value == pytest.approx(1, abs=1e-15)
        assert read_risk(back.patient.starting_risk_text) == reading
    else:
        assert there.patient.starting_risk_text == text


def test_a_readable_row_takes_the_other_form() -> None:
    """38 and 374 become 38 of 412; a row that cannot be read keeps its text."""
    table = editing.in_form(OUTCOME, "events-of-total").table
    assert table == EventsOfTotal(
        first_left_text="38", first_right_text="1412", second_left_text="70", second_right_text="338*"
    )


def test_the_form_it_has_changes_nothing() -> None:
    """Asking for the form that the table has gives the same outcome."""
    assert editing.in_form(OUTCOME, "events-and-others") is OUTCOME


@pytest.mark.parametrize(("left", "right"), [("38/412", ""), ("", "374/412"), ("38 (9.2%)", "374"), ("38", "374/412")])
def test_a_total_in_a_cell_survives_the_other_form(left: str, right: str) -> None:
    """A row that says its total in one cell gives the same counts in the other form, and back."""
    row = EventsAndOthers(first_left_text=left, first_right_text=right)
    there = editing.in_form(Outcome(table=row), "events-of-total")
    back = editing.in_form(there, "events-and-others")
    for outcome in (there, back):
        reading = read_table(outcome.table)
        assert (reading.first.left, reading.first.right, reading.first.total) == (38, 374, 412)
        assert not reading.marks


@given(st.lists(st.integers(0, 10**8), min_size=4, max_size=4))
def test_the_other_form_and_back_keeps_every_count(counts: list[int]) -> None:
    """Four plain counts come back as they were typed."""
    outcome = Outcome(table=EventsAndOthers(**dict(zip(CELLS, map(str, counts), strict=True))))
    there = editing.in_form(outcome, "events-of-total")
    assert read_table(there.table) == read_table(outcome.table)
    assert editing.in_form(there, "events-and-others") == outcome


@pytest.mark.parametrize("welcome", [True, False])
@pytest.mark.parametrize("turned", [True, False])
def test_welcome_is_said_of_the_counted_outcome(welcome: bool, turned: bool) -> None:
    """Whichever column is counted, it is the one that is called welcome or not."""
    outcome = editing.count_other_outcome(OUTCOME) if turned else OUTCOME
    assert editing.with_welcome(outcome, welcome=welcome).welcome is welcome


def test_choices_take_only_what_there_is() -> None:
    """Every design, layout, effect and family can be chosen, and nothing else."""
    for design in DESIGNS:
        assert editing.with_design(OUTCOME, design).design == design
    for layout in get_args(Layout):
        assert editing.with_layout(OUTCOME, layout).layout == layout
    for effect in get_args(Effect):
        assert editing.with_effect(OUTCOME, effect).patient.effect == effect
    for family in FAMILIES:
        assert editing.with_family(RECORD, family).choices.family == family
    wrong: Any = "guess"
    for measure in PAPER_MEASURES:
        assert editing.with_paper_measure(OUTCOME, measure).paper_measure == measure
        assert editing.with_adjusted_measure(OUTCOME, measure).adjusted_measure == measure
    for where in WHERE:
        assert editing.with_where(OUTCOME, where).where == where
    for counting in get_args(Counting):
        assert editing.with_counting(OUTCOME, counting).counting == counting
    refusing = (
        editing.with_design,
        editing.with_layout,
        editing.with_effect,
        editing.with_counting,
        editing.with_where,
        editing.with_paper_measure,
        editing.with_adjusted_measure,
        editing.in_form,
    )
    for refuse in refusing:
        with pytest.raises(ValueError, match="guess"):
            refuse(OUTCOME, wrong)
    with pytest.raises(ValueError, match="guess"):
        editing.with_family(RECORD, wrong)


def test_a_level_stays_within_its_range() -> None:
    """A level from 80% to 99.9% is taken as it is; any other is refused."""
    for level in (0.80, 0.999):
        assert editing.with_level(RECORD, level).choices == Choices(level=level)
    for wrong in (0.79, 1.0, 95, float("nan")):
        with pytest.raises(ValueError, match="level"):
            editing.with_level(RECORD, wrong)


def test_one_outcome_of_a_record_is_replaced() -> None:
    """The outcome at its place changes, its neighbours stay."""
    new = editing.with_design(OUTCOME, "survey")
    assert editing.with_outcome(RECORD, 1, new).outcomes == (OUTCOME, new)
    assert editing.with_outcome(RECORD, 0, new).outcomes == (new, Outcome())
    assert changed(RECORD, editing.with_outcome(RECORD, 0, new)) == {"outcomes"}
    for place in (-1, 2):
        with pytest.raises(IndexError):
            editing.with_outcome(RECORD, place, new)


@pytest.mark.parametrize("field", ["paper", "adjusted"])
def test_a_printed_effect_is_called_what_it_names(field: str) -> None:
    """Typing a name settles the measure; without the name it stays; a p alone names none, nor does a number needed."""

    def called(outcome: Outcome) -> str:
        return str(getattr(outcome, f"{field}_measure"))

    outcome = editing.edit_text(Outcome(adjusted_measure="risk_ratio"), f"{field}_text", "0.49")
    assert called(outcome) == "risk_ratio"
    outcome = editing.edit_text(outcome, f"{field}_text", "aOR 0.49 (0.32 to 0.75); P = 0.001")
    assert called(outcome) == "odds_ratio"
    for text in ("0.49 (0.32 to 0.75)", "P = 0.001", "NNT 12", ""):
        assert called(editing.edit_text(outcome, f"{field}_text", text)) == "odds_ratio"
    assert called(editing.edit_text(outcome, f"{field}_text", "hazard ratio 0.7, OR 0.5")) == "hazard_ratio"
    assert called(editing.edit_text(outcome, f"{field}_text", "RR 0.5 " * 100_000)) == "odds_ratio"
