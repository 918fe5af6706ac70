"""The page for a patient: one sheet, one metric, real text, clean margins, and nothing of the machine in its files."""

from __future__ import annotations

import re
import zlib
from datetime import date
from xml.etree import ElementTree as ET

import pytest
from msgspec.structs import replace
from PySide6.QtGui import QColor, QImage

from fourcount.appraisal.appraise import appraise
from fourcount.ink.handout import MARGIN, PAPERS, PER_MM, Handout, NoPage, compose
from fourcount.ink.handout_file import DOTS, as_pdf, as_png, as_svg, page_image, writer_for
from fourcount.ink.palette import PAPER
from fourcount.ink.paper_style import PaperStyle
from fourcount.ink.plain_picture import captions, on_one_line
from fourcount.picture.common import common_denominator
from fourcount.picture.options import USUAL
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from patient_outcomes import AT_TWELVE, CASE_CONTROL, HARM, HAZARD, LONG, SHOWN, SMALL, TINY, TRIAL, WELCOME

TODAY = date(2026, 12, 1)
RECORD = Record(title_text="Night lights <b> & more", source_text="table 2")


def grey_of(colour: str) -> int:
    """The shade of a colour where a page is printed in grey."""
    dot = QImage(1, 1, QImage.Format.Format_RGB32)
    dot.fill(QColor(colour))
    return dot.convertToFormat(QImage.Format.Format_Grayscale8).pixelColor(0, 0).lightness()


def page_of(*outcomes: Outcome, paper: str = "a4", record: Record = RECORD) -> Handout | NoPage:
    """The page of some outcomes."""
    named = [(outcome, appraise(outcome, Choices())) for outcome in outcomes]
    return compose(record, named, PAPERS[paper], "9.8.7", TODAY)


def made(*outcomes: Outcome, paper: str = "a4") -> Handout:
    """The page of outcomes that fit."""
    page = page_of(*outcomes, paper=paper)
    assert isinstance(page, Handout)
    return page


def pdf_texts(data: bytes) -> str:
    """The text of a PDF as its own tables say it: glyphs by the ToUnicode maps of the fonts in use."""
    objects = {int(m[1]): m[2] for m in re.finditer(rb"(\d+) 0 obj\s(.*?)endobj", data, re.DOTALL)}
    streams: dict[int, bytes] = {}
    for number, body in objects.items():
        if b"FlateDecode" in body:
            raw = body.split(b"stream", 1)[1].lstrip(b"\r\n").rsplit(b"endstream", 1)[0]
            streams[number] = zlib.decompressobj().decompress(raw)
    maps = {}
    for number, body in objects.items():
        if found := re.search(rb"/ToUnicode (\d+) 0 R", body):
            maps[number] = _to_unicode(streams.get(int(found[1]), objects[int(found[1])]))
    names = {}
    for body in objects.values():
        for name, number in re.findall(rb"/(F\d+) (\d+) 0 R", body):
            names[name] = maps.get(int(number), {})
    content = max(streams.values(), key=lambda stream: stream.count(b"Tf"))
    said, table = [], {}
    for font, glyphs in re.findall(rb"/(F\d+) [\d.]+ Tf|<([0-9a-fA-F]+)>", content):
        if font:
            table = names.get(font, {})
        else:
            codes = [int(glyphs[i : i + 4], 16) for i in range(0, len(glyphs), 4)]
            said.append("".join(table.get(code, "") for code in codes))
    return "".join(said)


def _to_unicode(stream: bytes) -> dict[int, str]:
    table = {}
    for block in re.findall(rb"beginbfrange(.*?)endbfrange", stream, re.DOTALL):
        for low, high, target in re.findall(rb"<(\w+)>\s*<(\w+)>\s*(\[.*?\]|<\w+>)", block, re.DOTALL):
            targets = re.findall(rb"<(\w+)>", target)
            for i, code in enumerate(range(int(low, 16), int(high, 16) + 1)):
                text = targets[i] if len(targets) > 1 else targets[0]
                shift = 0 if len(targets) > 1 else i
                table[code] = chr(int(text[-4:], 16) + shift)
    return table


def squeezed(text: str) -> str:
    """Text without the spaces, which a PDF may say by position alone."""
    return re.sub(r"\s+", "", text)


def test_a_pdf_can_be_searched() -> None:
    """Numbers, names and sentences of every outcome stand in the PDF as text."""
    text = squeezed(pdf_texts(as_pdf(made(AT_TWELVE, HARM))))
    for said in ("12 in 100", "94 in 100 do not fall", "15 in 100", "Each figure is one person", "table 2", "9.8.7"):
        assert squeezed(said) in text


@pytest.mark.parametrize(("paper", "box"), [("a4", (595, 842)), ("letter", (612, 792))])
def test_a_pdf_is_one_sheet_with_a_title_and_no_author(paper: str, box: tuple[int, int]) -> None:
    """One page of its paper, titled after the study; author empty, no name of a person or machine."""
    data = as_pdf(made(TRIAL, paper=paper))
    sizes = re.findall(rb"/MediaBox \[\s*0 0 ([\d.]+) ([\d.]+)", data)
    assert [(round(float(w)), round(float(h))) for w, h in sizes] == [box]
    assert RECORD.title_text.encode("utf-16-be") in data or RECORD.title_text.encode() in data
    authors = re.findall(rb"/Author \((.*?)\)", data)
    assert all(author in (b"", b"\xfe\xff") for author in authors)
    assert b"/Creator (\xfe\xff" + "Fourcount".encode("utf-16-be") in data or b"/Creator (Fourcount" in data


def test_an_svg_has_real_text_a_title_and_a_description() -> None:
    """Its text can be searched, its title is the study's, and all it shows is described; what was typed is escaped."""
    root = ET.fromstring(as_svg(made(AT_TWELVE, HARM)).decode())
    space = {"svg": "http://www.w3.org/2000/svg"}
    assert root.findtext("svg:title", namespaces=space) == RECORD.title_text
    description = root.findtext("svg:desc", namespaces=space) or ""
    assert "6 in 100" in description
    assert "We cannot say which people." in description
    said = squeezed("".join("".join(text.itertext()) for text in root.iter("{http://www.w3.org/2000/svg}text")))
    for part in ("12 in 100", "88 in 100 do not fall", "Bleeding in 12 months", "Night lights <b> & more"):
        assert squeezed(part) in said
    assert root.findall(".//svg:image", space) == []


def test_a_png_is_fine_enough_to_print() -> None:
    """At least 200 dots per inch, and it says so."""
    image = QImage.fromData(as_png(made(TRIAL)))
    assert DOTS >= 200
    assert image.width() == pytest.approx(210 / 25.4 * DOTS, abs=2)
    assert image.dotsPerMeterX() == pytest.approx(DOTS / 0.0254, abs=2)


@pytest.mark.parametrize("paper", PAPERS)
@pytest.mark.parametrize(
    "outcomes",
    [
        (TRIAL,),
        (AT_TWELVE, HARM),
        (AT_TWELVE, HARM, WELCOME),
        (AT_TWELVE, HARM, WELCOME, HAZARD),
        (SMALL, TINY),
        (LONG,),
    ],
    ids=["one", "two", "three", "four", "small", "long"],
)
def test_margins_stay_white(outcomes: tuple[Outcome, ...], paper: str) -> None:
    """Nothing is drawn within 12 mm of the paper's edge, which printers keep clear."""
    image = page_image(made(*outcomes, paper=paper), 96)
    width, height, edge = image.width(), image.height(), round(12 * PER_MM)
    grey = image.convertToFormat(QImage.Format.Format_Grayscale8)
    rows = [bytes(grey.constScanLine(y))[:width] for y in range(height)]
    white = b"\xff" * width
    assert all(row == white for row in (*rows[:edge], *rows[height - edge :]))
    assert all(row[:edge] == white[:edge] and row[width - edge :] == white[:edge] for row in rows)
    assert MARGIN >= 12


@pytest.mark.parametrize("paper", PAPERS)
def test_blocks_end_above_the_foot(paper: str) -> None:
    """The outcomes never run into the small print: the rule above it has white on both sides."""
    page = made(AT_TWELVE, HARM, WELCOME, HAZARD, paper=paper)
    style, setting, array = page._fit
    wide = (page.paper.width - 2 * MARGIN) * PER_MM
    blocks = sum(block.height(style, setting, wide, array) + 2 * style.px(12) for block in page._blocks)
    assert blocks < (page.paper.height - 2 * MARGIN) * PER_MM - 150


@pytest.mark.parametrize("paper", PAPERS)
def test_too_many_outcomes_are_refused_with_how_many_fit(paper: str) -> None:
    """Four of the usual kind fit on either paper; of ten, as many as fit are named, and so many do fit."""
    four = (AT_TWELVE, HARM, WELCOME, HAZARD)
    assert isinstance(page_of(*four, paper=paper), Handout)
    page = page_of(*four, TRIAL, CASE_CONTROL, *four, paper=paper)
    assert isinstance(page, NoPage)
    told = re.fullmatch(r"(\d) of these 10 outcomes fit on one page: untick (\d)\.", page.sentence)
    assert told
    fit = int(told[1])
    assert fit + int(told[2]) == 10
    assert fit >= 4
    assert isinstance(page_of(*(*four, TRIAL, CASE_CONTROL, *four)[:fit], paper=paper), Handout)


def test_names_that_never_end_are_refused() -> None:
    """An outcome whose words fill more than a page is no page, and the sentence says what to shorten."""
    endless = replace(TRIAL, first_label_text="very long " * 190, left_words_text="fell and " * 200)
    page = page_of(endless)
    assert isinstance(page, NoPage)
    assert "shorten" in page.sentence


def test_nothing_ticked_is_no_page() -> None:
    """A page of no outcome is refused."""
    assert page_of() == NoPage("Tick at least one outcome for the page.")


def test_outcomes_share_one_denominator_where_all_can_be_drawn() -> None:
    """12 against 6 and 2.4 against 2.6 in 100 are both drawn of 1,000."""
    page = made(AT_TWELVE, SMALL)
    assert [block._it.plan.denominator for block in page._blocks] == [1_000, 1_000]
    assert "Each picture shows 1,000 people" in page.words.lead
    assert page._blocks[0]._it.words.without.number == "120 in 1,000"


def test_outcomes_that_share_none_keep_their_own_and_the_page_says_so() -> None:
    """What is too small to draw as people leaves the other at 100, and the page owns up to it."""
    page = made(AT_TWELVE, TINY)
    assert [block._it.plan.denominator for block in page._blocks] == [100, None]
    assert "do not all show the same number" in page.words.lead


@pytest.mark.parametrize(
    ("pairs", "denominator"),
    [
        ([(0.12, 0.06)], 100),
        ([(0.12, 0.06), (0.024, 0.026)], 1_000),
        ([(0.12, 0.06), (0.0002, 0.0001)], 10_000),
        ([(0.12, 0.06), (0.000002, 0.000001)], None),
        ([], 100),
    ],
)
def test_the_common_denominator_is_the_first_that_is_honest_for_all(
    pairs: list[tuple[float, float]], denominator: int | None
) -> None:
    """The smallest of 100, 1,000 and 10,000 that hides and invents nothing for any outcome."""
    assert common_denominator(pairs) == denominator


@pytest.mark.parametrize("name", SHOWN)
def test_every_kind_of_outcome_makes_a_page(name: str) -> None:
    """Each alone fits on A4, and its title and sentences are in the description."""
    page = made(SHOWN[name])
    assert "We cannot say which people." in page.words.description


def test_states_differ_in_grey() -> None:
    """In grey, filled figures, outlines and paper are three shades that stand well apart."""
    image = page_image(made(AT_TWELVE), 150).convertToFormat(QImage.Format.Format_Grayscale8)
    everywhere = ((x, y) for x in range(90, 500) for y in range(360, 700))
    shades = [image.pixelColor(*spot).lightness() for spot in everywhere]
    filled, outlined, white = (grey_of(colour) for colour in (PAPER.accent, PAPER.outline, PAPER.page))
    assert all(shades.count(grey) > 100 for grey in (filled, outlined, white))
    assert outlined - filled > 30
    assert white - outlined > 100


@pytest.mark.parametrize(
    ("name", "known"), [("a.pdf", True), ("a.PNG", True), ("a.svg", True), ("a.doc", False), ("a", False)]
)
def test_the_kind_of_file_follows_from_its_name(name: str, known: bool) -> None:
    """PDF, PNG and SVG by their suffix, however it is written; nothing else."""
    assert (writer_for(name) is not None) == known


@pytest.mark.parametrize(
    ("outcomes", "told"),
    [((AT_TWELVE, HAZARD), True), ((AT_TWELVE, HARM), True), ((TRIAL, HARM), False), ((AT_TWELVE,), False)],
    ids=["two starts", "typed and the study's", "the study's", "one"],
)
def test_heads_say_where_people_differ(outcomes: tuple[Outcome, ...], told: bool) -> None:
    """Where two outcomes show people who start differently each head says who they are, not a line of small print."""
    said = squeezed(pdf_texts(as_pdf(made(*outcomes))))
    starts = [squeezed(f"{name}, for people") in said for name in ("Falls in 12 months", "Bleeding in 12 months")]
    assert any(starts) == told
    assert (squeezed("These people") in said) != told


@pytest.mark.parametrize("outcomes", [(AT_TWELVE, HARM), (AT_TWELVE, HARM, WELCOME)], ids=["two", "three"])
@pytest.mark.parametrize("paper", PAPERS)
def test_people_are_large_where_few_outcomes_stand(outcomes: tuple[Outcome, ...], paper: str) -> None:
    """Of two or three outcomes people are drawn as persons at least 14 units of 1/96 inch, near 4 mm, apart."""
    page = made(*outcomes, paper=paper)
    style, setting, array = page._fit
    wide = (page.paper.width - 2 * MARGIN) * PER_MM
    assert all(block.has_persons(style, setting, wide, array) for block in page._blocks)
    assert array >= 140


def test_rows_of_persons_do_not_touch() -> None:
    """Beside their captions persons stand in rows with white between feet and heads, and a key beside each array."""
    it = made(AT_TWELVE, HARM, WELCOME)._blocks[0]._aside
    laid, icons = it._laid(PaperStyle(), 320, 150)
    assert icons == "person"
    assert laid.height == pytest.approx(150)
    assert laid.y(1) - laid.y(0) > 1.1 * laid.down
    assert [entry.text for entry in it._entries(1)] == ["spared, on balance"]


@pytest.mark.parametrize("width", range(60, 420, 24))
def test_captions_of_both_groups_break_alike(width: int) -> None:
    """At any width both groups' captions have the same lines: if one percentage goes to its own line, both do."""
    words = made(AT_TWELVE)._blocks[0]._it.words
    one, two = captions(PaperStyle(), (words.without, words.with_), width)
    assert len(one) == len(two) in (3, 4)
    if len(one) == 3:
        assert all(on_one_line(caption[1], width) for caption in (one, two))
        assert one[1][0].font == two[1][0].font


def test_a_page_of_bars_says_nothing_of_marks() -> None:
    """Where nothing is drawn as people nothing is said of what one of them is; beside people only of those."""
    lead = made(TINY).words.lead
    assert "person" not in lead
    assert made(TRIAL, TINY).words.lead.startswith("Each figure is one person.")


@pytest.mark.parametrize("count", range(1, 5))
def test_the_range_is_on_the_page_where_it_is_asked_for(count: int) -> None:
    """One to four outcomes with their ranges fit a page, drawn and said; without limits that is said."""
    alone = replace(HAZARD, paper_text="0.72")
    outcomes = (AT_TWELVE, HARM, alone, WELCOME)[:count]
    named = [(outcome, appraise(outcome, Choices())) for outcome in outcomes]
    page = compose(RECORD, named, PAPERS["a4"], "9.8.7", TODAY, USUAL._replace(uncertainty=True))
    assert isinstance(page, Handout)
    assert page.words.description.count("it could be from") == count - (count > 2)
    notes = [block._aside._words.note for block in page._blocks]
    assert all("it could be from" in note or note == "A range cannot be given here." for note in notes)


def test_the_number_that_fits_makes_a_page() -> None:
    """So many as the sentence says are a page, and one more are not, however many outcomes there are."""
    outcomes = (AT_TWELVE, HARM, WELCOME, HAZARD) * 50
    page = page_of(*outcomes)
    assert isinstance(page, NoPage)
    fits = int(page.sentence.split()[0])
    assert page.sentence == f"{fits} of these 200 outcomes fit on one page: untick {200 - fits}."
    assert isinstance(page_of(*outcomes[:fits]), Handout)
    assert isinstance(page_of(*outcomes[: fits + 1]), NoPage)
