"""Where the parts of a curve stand: names clear of one another and of lines, words of any length bounded."""

from __future__ import annotations

import math
from itertools import pairwise

import msgspec
import pytest

from curves import AT_TWELVE, FOOT, RISING, Notes, laid, parts, with_counts
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.curve import curve
from fourcount.appraisal.findings import Gap
from fourcount.ink.curve_layout import CurveLayout, dash_of
from fourcount.ink.curve_sheet import Sheet
from fourcount.ink.palette import DARK, LIGHT, contrast
from fourcount.picture.places import crosses
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording.curve import View, curve_words, shown_lines


@pytest.fixture
def outcome() -> Outcome:
    """The worked example for a patient who starts at 12%."""
    return AT_TWELVE


@pytest.fixture
def rising() -> Outcome:
    """A table whose risk ratio passes 100%."""
    return RISING


@pytest.mark.parametrize("zoom", [1.0, 1.5, 2.0])
@pytest.mark.parametrize("place", [0, 1, 2, 3])
@pytest.mark.parametrize("whole", [False, True])
def test_no_text_lies_on_another(rising: Outcome, zoom: float, place: int, whole: bool) -> None:
    """At every text size, in every view, names keep apart and stay on the sheet."""
    sheet = Sheet(760 * zoom, 460 * zoom, zoom)
    texts = laid(rising, place, whole=whole, sheet=sheet).texts
    for i, (x, y, wide, _, size) in enumerate(texts):
        assert x >= 0
        assert x + wide <= sheet.width
        assert size / 2 <= y <= sheet.height - size / 2
        for x2, y2, wide2, _, size2 in texts[i + 1 :]:
            apart = x + wide <= x2 or x2 + wide2 <= x or abs(y - y2) >= min(size, size2)
            assert apart


@pytest.mark.parametrize("zoom", [1.0, 1.5, 2.0])
@pytest.mark.parametrize("place", [0, 1, 2])
def test_names_of_points_are_clear_of_axes_and_lines(outcome: Outcome, zoom: float, place: int) -> None:
    """At every text size, in a window of 1,280 by 800, nothing is drawn through them."""
    sheet = Sheet(1160, 520, zoom)
    notes = laid(outcome, place, sheet=sheet)
    boxes = [
        (x, y - size * 0.65, x + wide, y + size * 0.65)
        for x, y, wide, text, size in notes.texts
        if text in ("study, 17.1%", "patient, 12%")
    ]
    lines = [[notes.where(*value) for value in points] for points, *_ in notes.lines]
    assert len(boxes) == 2
    assert all(box[0] > notes.box[0] and box[1] > notes.box[1] for box in boxes)
    assert not [line for line in lines for box in boxes if crosses(box, line)]


@pytest.mark.parametrize("zoom", [1.0, 2.0])
@pytest.mark.parametrize("size", [(360, 240), (760, 460), (20, 10)])
@pytest.mark.parametrize("foot", [(), FOOT])
@pytest.mark.parametrize("typed", ["a fall that led to a fracture, ", "x", "\u5149", "W "])
def test_words_of_any_length_leave_room_for_the_curve(
    rising: Outcome, zoom: float, size: tuple[int, int], foot: tuple[str, ...], typed: str
) -> None:
    """2,000 characters of each keep on the sheet, apart, with a sign where they are cut; the axes keep their room."""
    fields = ("left_words_text", "first_label_text", "second_label_text", "span_text", "name_text")
    outcome = msgspec.structs.replace(rising, **dict.fromkeys(fields, (typed * 2000)[:2000]))
    for place in range(4):
        notes = Notes()
        layout = CurveLayout(*parts(outcome, place), LIGHT, Sheet(size[0] * zoom, size[1] * zoom, zoom, foot=foot))
        sheet = layout.grow(notes)
        layout.draw(notes)
        left, low, right, high = notes.box
        assert right - left >= 100 * zoom
        assert high - low >= 70 * zoom
        assert any("…" in text for *_, text, _ in notes.texts)
        for i, (x, y, wide, _, tall) in enumerate(notes.texts):
            assert x >= 0
            assert x + wide <= sheet.width
            assert y - tall / 2 >= 0
            assert y + tall / 2 <= sheet.height
            for x2, y2, wide2, _, tall2 in notes.texts[i + 1 :]:
                assert x + wide <= x2 or x2 + wide2 <= x or abs(y - y2) >= min(tall, tall2)


@pytest.mark.parametrize("place", [0, 1, 2, 3])
@pytest.mark.parametrize("counts", [(60, 140, 22, 178), (38, 374, 70, 339), (1, 399, 40, 360), (150, 50, 20, 180)])
def test_marks_of_the_axes_keep_apart_on_the_smallest_sheet(
    outcome: Outcome, counts: tuple[int, ...], place: int
) -> None:
    """A mark has the height of its words to itself, in even and in logarithmic axes."""
    outcome = with_counts(outcome, *counts)
    for zoom in (1.0, 2.0):
        notes = laid(outcome, place, sheet=Sheet(360 * zoom, 240 * zoom, zoom))
        places = [math.log(mark) if place == 3 else mark for mark in notes.up.values]
        ends = (math.log(notes.up.low), math.log(notes.up.high)) if place == 3 else (notes.up.low, notes.up.high)
        dots = (notes.box[3] - notes.box[1]) / (ends[1] - ends[0])
        assert len(places) >= 2
        assert all((after - before) * dots >= 12 * 1.2 * zoom for before, after in pairwise(places))


def test_a_page_grows_with_its_texts(outcome: Outcome) -> None:
    """The curve has the room that was asked for, whatever stands above and under it."""
    heights, rooms = [], []
    for foot in (FOOT, FOOT * 40):
        notes = Notes()
        layout = CurveLayout(*parts(outcome), LIGHT, Sheet(500, 340, foot=foot))
        heights.append(layout.grow(notes).height)
        layout.draw(notes)
        rooms.append(notes.box[3] - notes.box[1])
    assert heights[0] > 340
    assert heights[1] > heights[0] + 39 * 10
    assert rooms[0] == pytest.approx(rooms[1])


@pytest.mark.parametrize("zoom", [1.0, 1.5])
def test_leaders_keep_below_the_words_of_the_axis(rising: Outcome, zoom: float) -> None:
    """From a line that ends at 100% to its name, however long the words above the axis are."""
    long = msgspec.structs.replace(rising, first_label_text="night lights in every room, " * 20)
    for foot in ((), FOOT):
        notes = laid(long, whole=True, sheet=Sheet(760 * zoom, 460 * zoom, zoom, foot=foot))
        for points in notes.strokes:
            assert max(y for _, y in points) <= notes.box[3] + 1


def test_lines_are_told_without_colour(outcome: Outcome) -> None:
    """Each line has a dash of its own, and each has its name on the sheet."""
    drawn, view, words = parts(outcome)
    dashes = [dash_of(line) for line in shown_lines(drawn, view)]
    assert len(set(dashes)) == len(dashes) == 3
    found = " ".join(text for *_, text, _ in laid(outcome).texts)
    assert all(name.split(",")[0] in found for name in words.names)
    assert max(laid(outcome).widths) == 2.6  # the line that is chosen is the thickest


def test_nothing_drawn_lies_beyond_the_axes(rising: Outcome) -> None:
    """No line, band or point leaves what the axes show, so that nothing is cut off."""
    for place in range(4):
        notes = laid(rising, place, whole=True)
        values = [value for points, *_ in notes.lines for value in points]
        values += [(x, y) for x, y, _ in notes.points]
        values += [(x, y) for rows in notes.areas for x, low, high in rows for y in (low, high)]
        assert values
        assert all(0 <= x <= notes.across.high for x, _ in values)
        assert all(notes.up.low <= y <= notes.up.high * (1 + 1e-12) for _, y in values)


def test_a_line_stops_where_its_risk_is_100(rising: Outcome) -> None:
    """The risk ratio's line ends at 100%, at one over the ratio; the band is filled as far as both limits go."""
    drawn, *_ = parts(rising, whole=True)
    ratio = drawn.lines[0]
    notes = laid(rising, whole=True)
    longest = next(points for (points, *_), width in zip(notes.lines, notes.widths, strict=True) if width == 2.6)
    assert longest[-1] == pytest.approx((ratio.last, 1.0))
    (rows,) = notes.areas
    assert rows[-1][2] == pytest.approx(1.0)
    both = [point.start for point in ratio.points if not isinstance(point.high, Gap)]
    assert rows[-1][0] == both[-1]


def test_the_study_is_square_and_the_patient_round(outcome: Outcome) -> None:
    """The two points differ in shape, and stand at their own risks."""
    notes = laid(outcome)
    assert notes.points == [
        (70 / 409, 38 / 412, "square"),
        (0.12, pytest.approx(0.12 * (38 / 412) / (70 / 409)), "round"),
    ]


def test_nothing_to_draw_is_a_sentence() -> None:
    """Without any effect the sheet has the reason and no axes."""
    findings = appraise(Outcome(), Choices())
    drawn = curve(findings)
    notes = Notes()
    words = curve_words(Record(), Outcome(), findings, drawn, View())
    CurveLayout(drawn, View(), words, LIGHT, Sheet(400, 300)).draw(notes)
    assert " ".join(text for *_, text, _ in notes.texts) == words.notes[0]
    assert not notes.lines


@pytest.mark.parametrize("palette", [LIGHT, DARK])
def test_lines_stand_out_from_the_page(palette) -> None:
    """Lines and points have 3:1 at least against the page, and their names 4.5:1."""
    assert min(contrast(part, palette.page) for part in (palette.ink, palette.accent, palette.muted)) >= 4.5
    assert contrast(palette.outline, palette.page) >= 3


def test_a_very_long_name_is_cut_to_its_room(outcome: Outcome) -> None:
    """One endless word does not push the axes off the sheet."""
    outcome = msgspec.structs.replace(outcome, first_label_text="x" * 3000, name_text="y" * 3000)
    notes = laid(outcome)
    assert all(x + wide <= 760 for x, _, wide, *_ in notes.texts)
    assert notes.box[2] > notes.box[0] + 200
