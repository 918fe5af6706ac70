"""The four cells together."""

from __future__ import annotations

from fractions import Fraction

import pytest
from hypothesis import given
from hypothesis import strategies as st

from fourcount.record.entry.percent import printed_percent, rounds_to
from fourcount.record.entry.readings import GroupCounts, TableReading
from fourcount.record.entry.table import read_table
from fourcount.record.outcome import CELLS, EventsAndOthers, EventsOfTotal

NEARLY = st.text(st.sampled_from("0123456789/ ().%,of*-"), max_size=12)
CELL_TEXT = (
    st.sampled_from(["", "0", "38", "374", "412", "38/412", "374/412", "38 (9.2%)", "x"])
    | NEARLY
    | st.text(st.characters(exclude_categories=()), max_size=8)
)


def others(*row: str) -> TableReading:
    """The reading of a table of events and non-events whose second group is 70 and 338."""
    return read_table(EventsAndOthers(**dict(zip(CELLS, (*row, "70", "338"), strict=True))))


def of_total(*row: str) -> TableReading:
    """The reading of a table of events of all whose second group is 70 of 408."""
    return read_table(EventsOfTotal(**dict(zip(CELLS, (*row, "70", "408"), strict=True))))


def marks(reading: TableReading) -> list[tuple[str, str, bool]]:
    return [(mark.field, mark.key, mark.used) for mark in reading.marks]


WHOLE = GroupCounts(left=38, right=374, total=412)


@pytest.mark.parametrize(
    "row",
    [
        ("38", "374"),
        ("38/412", ""),
        ("38/412", "374"),
        ("", "374/412"),
        ("38 of 412", "374 of 412"),
        ("38 (9.2%)", "374"),
    ],
)
def test_events_and_others_give_a_whole_row(row: tuple[str, str]) -> None:
    """A row of events and non-events is whole from two counts, or from one that says its total."""
    reading = others(*row)
    assert reading.first == WHOLE
    assert reading.second == GroupCounts(left=70, right=338, total=408)
    assert not reading.marks


@pytest.mark.parametrize("row", [("38", "412"), ("38/412", ""), ("38/412", "412"), ("38 (9.2%)", "412 (50.2%)")])
def test_events_of_a_total_give_a_whole_row(row: tuple[str, str]) -> None:
    """A row of events and total is whole from both, or from a cell that says both."""
    reading = of_total(*row)
    assert reading.first == WHOLE
    assert reading.second == GroupCounts(left=70, right=338, total=408)
    assert not reading.marks


@pytest.mark.parametrize(
    ("row", "first", "marked"),
    [
        (("38/412", "370"), GroupCounts(right=370), [("first_left_text", "total-disagrees", False)]),
        (("38", "374/400"), GroupCounts(left=38), [("first_right_text", "total-disagrees", False)]),
        (("38/412", "x"), GroupCounts(left=38, total=412), [("first_right_text", "not-a-count", False)]),
        (("38*", "374"), GroupCounts(right=374), [("first_left_text", "not-a-count", False)]),
        (("38", ""), GroupCounts(left=38), []),
        (("", "374"), GroupCounts(right=374), []),
        (("", ""), GroupCounts(), []),
        (("38 (9.3%)", "374"), WHOLE, [("first_left_text", "percent-disagrees", True)]),
        (("38/412 (9%)", "374 (91.8%)"), WHOLE, [("first_right_text", "percent-disagrees", True)]),
        (("38 (<9%)", "374"), WHOLE, [("first_left_text", "percent-disagrees", True)]),
    ],
)
def test_a_row_of_others_goes_on_beside_a_mark(
    row: tuple[str, str], first: GroupCounts, marked: list[tuple[str, str, bool]]
) -> None:
    """A marked cell that is not used gives None, one that is used gives its count, and the rest goes on."""
    reading = others(*row)
    assert reading.first == first
    assert marks(reading) == marked
    assert reading.second == GroupCounts(left=70, right=338, total=408)


@pytest.mark.parametrize(
    ("row", "first", "marked"),
    [
        (("38/412", "410"), GroupCounts(total=410), [("first_left_text", "total-disagrees", False)]),
        (("413", "412"), GroupCounts(total=412), [("first_left_text", "events-above-total", False)]),
        (("x", "412"), GroupCounts(total=412), [("first_left_text", "not-a-count", False)]),
        (("38", "x"), GroupCounts(left=38), [("first_right_text", "not-a-count", False)]),
        (("38", "412/500"), GroupCounts(left=38), [("first_right_text", "not-a-count", False)]),
        (("", "412"), GroupCounts(total=412), []),
        (("38", ""), GroupCounts(left=38), []),
        (("38 (9.3%)", "412"), WHOLE, [("first_left_text", "percent-disagrees", True)]),
    ],
)
def test_a_row_of_a_total_goes_on_beside_a_mark(
    row: tuple[str, str], first: GroupCounts, marked: list[tuple[str, str, bool]]
) -> None:
    """Events above the total are marked in their own cell; the total stays known."""
    reading = of_total(*row)
    assert reading.first == first
    assert marks(reading) == marked


@pytest.mark.parametrize("form", [EventsAndOthers, EventsOfTotal])
def test_the_second_group_is_marked_like_the_first(form: type[EventsAndOthers] | type[EventsOfTotal]) -> None:
    """A percentage that disagrees is marked in either group, in either form."""
    table = form(
        first_left_text="38 (1%)", first_right_text="412", second_left_text="70 (1%)", second_right_text="408 (1%)"
    )
    expected = ["first_left_text", "second_left_text"] + ["second_right_text"] * (form is EventsAndOthers)
    assert marks(read_table(table)) == [(field, "percent-disagrees", True) for field in expected]


def test_a_percentage_may_be_of_the_column() -> None:
    """A percentage of all cases, as case-control studies print it, is not marked."""
    reading = others("30 (30%)", "374")
    assert reading.first.left == 30
    assert not reading.marks


def test_a_mark_tells_what_its_sentence_needs() -> None:
    """Marks carry what was typed and the numbers that disagree."""
    (mark,) = others("38/412", "370").marks
    assert mark.facts == {"text": "38/412", "typed": 412, "total": 408}
    (mark,) = others("38 (9.3%)", "374").marks
    assert mark.facts == {"text": "38 (9.3%)", "percent": "9.3%", "events": 38, "total": 412}


@pytest.mark.parametrize(
    ("printed", "events", "total", "fits"),
    [
        ("12%", 25, 200, True),  # 12.5 to the even digit
        ("13%", 25, 200, True),  # 12.5 up
        ("14%", 27, 200, True),  # 13.5 up and to the even digit
        ("13%", 27, 200, False),
        ("0.0%", 1, 3000, True),
        ("100%", 199, 200, True),
        ("99%", 199, 200, False),
        ("<1%", 1, 101, True),
        ("<1%", 1, 100, False),
        ("0%", 0, 0, True),
        ("1%", 0, 0, False),
    ],
)
def test_a_percentage_rounds_half_up_or_to_even(printed: str, events: int, total: int, fits: bool) -> None:
    """Both customs of rounding a half are accepted, and nothing else is."""
    percent = printed_percent(printed)
    assert percent is not None
    assert rounds_to(percent, events, total) is fits


@given(st.integers(1, 5000).flatmap(lambda n: st.tuples(st.integers(0, n), st.just(n))), st.integers(0, 4))
def test_a_rounded_percentage_fits_its_own_counts(counts: tuple[int, int], decimals: int) -> None:
    """Whatever counts are printed as a percentage, that percentage is not marked."""
    events, total = counts
    scaled = round(Fraction(100 * events * 10**decimals, total))
    whole, part = divmod(scaled, 10**decimals)
    percent = printed_percent(f"{whole}.{part:0{decimals}}%" if decimals else f"{whole}%")
    assert percent is not None
    assert percent.decimals == decimals
    assert rounds_to(percent, events, total)


@given(st.sampled_from([EventsAndOthers, EventsOfTotal]), st.tuples(CELL_TEXT, CELL_TEXT, CELL_TEXT, CELL_TEXT))
def test_every_table_gets_an_answer(
    form: type[EventsAndOthers] | type[EventsOfTotal], texts: tuple[str, str, str, str]
) -> None:
    """Reading never raises; counts are never negative, add up where all are known, and none comes from nothing."""
    reading = read_table(form(**dict(zip(CELLS, texts, strict=True))))
    for group, position in ((reading.first, "first"), (reading.second, "second")):
        counts = (group.left, group.right, group.total)
        assert all(count is None or count >= 0 for count in counts)
        if group.left is not None and group.right is not None:
            assert group.total == group.left + group.right
        unused = {mark.field for mark in reading.marks if not mark.used}
        if f"{position}_left_text" in unused:
            assert group.left is None
        if f"{position}_right_text" in unused:
            assert group.right is None
    assert len({mark.field for mark in reading.marks}) == len(reading.marks)


@pytest.mark.parametrize(
    ("cell", "value"),
    [
        ("38 374", 38_374),
        (" 1 204 567 ", 1_204_567),
        ("38 374 (9.1%)", 38_374),
        ("9/38 374", 38_374),
        ("38\u00a0374", None),
        ("38\u202f374", None),
        ("38\u2009374", None),
        ("38,374", None),
        ("38 of 374", None),
        ("38 (9.2%)", None),
    ],
)
def test_a_number_parted_by_an_ordinary_space_is_used_and_says_so(cell: str, value: int | None) -> None:
    """It may have been meant as two counts; the spaces of print are no reason to ask."""
    marks = [mark for mark in read_table(EventsAndOthers(first_left_text=cell)).marks if mark.key == "read-as"]
    facts = {"text": " ".join(cell.split()), "value": value}
    assert [(mark.field, mark.facts, mark.used) for mark in marks] == (
        [("first_left_text", facts, True)] if value is not None else []
    )
    assert read_table(EventsAndOthers(first_left_text=cell)).first.left is not None
