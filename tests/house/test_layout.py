"""The tree keeps its shape: what lies at the top, how long a file grows, what every test says."""

from __future__ import annotations

import ast
from pathlib import Path

import pytest

ROOT = Path(__file__).resolve().parents[2]
AT_THE_TOP = {"appsrc", "assets", "packaging", "tests", "README.md", "DEVELOPERS.md", "pyproject.toml"}
MADE_BY_TOOLS = {"build", "dist", "__pycache__"}
ROOMS = {"record", "stats", "appraisal", "wording", "picture", "publish", "ink", "face"}
LONGEST = 350
# In two halves, or this file would be the first to hold them.
UNFINISHED = ["TO" + "DO", "FIX" + "ME", "XX" + "X", "NotImplemented" + "Error"]

CODE = sorted(file for folder in ("appsrc", "packaging", "tests") for file in (ROOT / folder).rglob("*.py"))
TESTS = [file for file in CODE if file.name.startswith("test_")]


def shown(file: Path) -> str:
    return str(file.relative_to(ROOT))


def test_the_top_holds_only_what_belongs_there() -> None:
    """Nothing lies at the top but the four folders, two texts, the project file and dotfiles."""
    there = {entry.name for entry in ROOT.iterdir() if not entry.name.startswith(".")}
    assert there - MADE_BY_TOOLS <= AT_THE_TOP


def test_every_room_is_there() -> None:
    """The package has its eight rooms and no others."""
    rooms = {entry.parent.name for entry in (ROOT / "appsrc" / "fourcount").glob("*/__init__.py")}
    assert rooms == ROOMS


def test_packaging_is_no_package() -> None:
    """The folder packaging never hides the library of that name from what runs at the top."""
    assert not (ROOT / "packaging" / "__init__.py").exists()


@pytest.mark.parametrize("file", CODE, ids=shown)
def test_a_file_holds_one_idea(file: Path) -> None:
    """No module grows over 350 lines."""
    assert len(file.read_text(encoding="utf-8").splitlines()) <= LONGEST


@pytest.mark.parametrize("file", CODE, ids=shown)
def test_nothing_is_left_unfinished(file: Path) -> None:
    """No file carries a mark of work put off."""
    text = file.read_text(encoding="utf-8")
    assert not [mark for mark in UNFINISHED if mark in text]


@pytest.mark.parametrize("file", TESTS, ids=shown)
def test_every_test_says_what_it_tests(file: Path) -> None:
    """Each test function has a docstring, and what it begins with is a sentence."""
    functions = [
        node
        for node in ast.walk(ast.parse(file.read_text(encoding="utf-8")))
        if isinstance(node, ast.FunctionDef) and node.name.startswith("test_")
    ]
    silent = [
        node.name for node in functions if not (ast.get_docstring(node) or "").split("\n\n")[0].endswith((".", ".)"))
    ]
    assert functions
    assert not silent
