"""The other ways in which a doubtful paste can be understood."""

from __future__ import annotations

from fourcount.record.entry.readings import Pasted, PastedGroup
from fourcount.record.entry.turning import in_chosen_form, ways


def pasted(*cells, ambiguous=("others-or-totals", "orientation"), form="events-and-others", **rest):
    """Four bare counts."""
    groups = (
        PastedGroup(left_text=cells[0], right_text=cells[1], label="A"),
        PastedGroup(left_text=cells[2], right_text=cells[3], label="B"),
    )
    return Pasted(form=form, groups=groups, ambiguous=ambiguous, **rest)


def cells_of(way):
    return [text for group in way.groups for text in (group.left_text, group.right_text)]


def test_without_a_doubt_there_is_one_way():
    """What is certain has no other way round."""
    sure = pasted("38", "374", "70", "339", ambiguous=())
    assert ways(sure) == (sure,)


def test_the_way_that_was_taken_comes_first_and_all_differ():
    """Others or totals, rows or columns: every way once."""
    doubtful = pasted("3", "40", "7", "50")
    found = ways(doubtful)
    assert found[0] is doubtful
    assert [(way.form, cells_of(way)) for way in found] == [
        ("events-and-others", ["3", "40", "7", "50"]),
        ("events-of-total", ["3", "40", "7", "50"]),
        ("events-and-others", ["3", "7", "40", "50"]),
        ("events-of-total", ["3", "7", "40", "50"]),
    ]


def test_a_way_with_more_events_than_people_is_none():
    """38 of 412 and 70 of 409 cannot be 38 of 70 and 412 of 409."""
    assert not any(
        way.form == "events-of-total" and cells_of(way)[0:2] == ["38", "70"]
        for way in ways(pasted("38", "412", "70", "409"))
    )


def test_turning_rows_to_columns_turns_their_names():
    """Labels of rows become headings, and headings become labels."""
    turned = ways(pasted("1", "2", "3", "4", ambiguous=("orientation",), left_heading="fell", right_heading="not"))[1]
    assert cells_of(turned) == ["1", "3", "2", "4"]
    assert [group.label for group in turned.groups] == ["fell", "not"]
    assert (turned.left_heading, turned.right_heading) == ("A", "B")
    assert turned.layout == "across"


def test_pairs_or_groups_are_two_ways():
    """The same four counts in either form."""
    forms = [way.form for way in ways(pasted("12", "21", "9", "58", ambiguous=("pairs-or-groups",)))]
    assert forms == ["events-and-others", "pairs"]


def test_a_chosen_form_settles_the_doubt_about_forms():
    """Whoever chose 38 of 412 pastes totals; whoever chose pairs pastes pairs."""
    doubtful = pasted("38", "412", "70", "409")
    chosen = in_chosen_form(doubtful, "events-of-total")
    assert (chosen.form, chosen.ambiguous) == ("events-of-total", ())
    chosen = in_chosen_form(doubtful, "pairs")
    assert (chosen.form, chosen.ambiguous) == ("pairs", ("orientation",))


def test_the_first_form_settles_nothing():
    """A window begins in 38 · 374; nobody need have chosen it."""
    doubtful = pasted("38", "412", "70", "409")
    assert in_chosen_form(doubtful, "events-and-others") is doubtful


def test_what_cannot_be_of_the_chosen_form_is_not():
    """500 of 412 are no events of a total."""
    doubtful = pasted("500", "412", "70", "409")
    assert in_chosen_form(doubtful, "events-of-total") is doubtful


def test_a_total_that_stands_first_is_a_way():
    """412 and 38 may be 38 of 412: the counts change places, and so do their headings."""
    doubtful = pasted("412", "38", "409", "70", ambiguous=("others-or-totals",), left_heading="a", right_heading="b")
    found = ways(doubtful)
    assert [(way.form, cells_of(way), way.left_heading) for way in found] == [
        ("events-and-others", ["412", "38", "409", "70"], "a"),
        ("events-of-total", ["38", "412", "70", "409"], "b"),
    ]
    chosen = in_chosen_form(doubtful, "events-of-total")
    assert (chosen.form, cells_of(chosen)) == ("events-of-total", ["38", "412", "70", "409"])
