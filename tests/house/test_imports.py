"""Who may import whom: a room knows only the rooms it was built on."""

from __future__ import annotations

import ast
from pathlib import Path

import pytest

SOURCE = Path(__file__).resolve().parents[2] / "appsrc"
PACKAGE = SOURCE / "fourcount"
ROOMS = {"record", "stats", "appraisal", "wording", "picture", "publish", "ink", "face"}
MAY_IMPORT = {
    "record": set(),
    "stats": set(),
    "picture": set(),
    "appraisal": {"record", "stats"},
    "wording": {"record", "stats", "appraisal"},
    "publish": {"record", "appraisal", "wording"},
    "ink": {"record", "appraisal", "wording", "picture"},
    "face": ROOMS - {"stats"},
    "__main__": ROOMS,
    "__init__": {"publish"},
    "assets_folder": set(),
}
# Slow to import, or a way out of the machine. The roots that scipy.optimize would find are found in stats.
NOBODY_IMPORTS = (
    "scipy.stats",
    "scipy.optimize",
    "matplotlib.pyplot",
    "pandas",
    "statsmodels",
    "socket",
    "urllib.request",
    "http",
    "requests",
    "PySide6.QtNetwork",
)
FILES = sorted(PACKAGE.rglob("*.py"))


def room_of(name: str) -> str:
    """``fourcount.stats.risk`` -> ``stats``; ``fourcount`` itself -> ``__init__``."""
    parts = name.split(".")
    return parts[1] if len(parts) > 1 else "__init__"


def imported_by(file: Path) -> set[str]:
    """Every module a file names in an import, inside functions too; ``from a import b`` counts as a and a.b."""
    found: set[str] = set()
    for node in ast.walk(ast.parse(file.read_text(encoding="utf-8"))):
        if isinstance(node, ast.Import):
            found.update(alias.name for alias in node.names)
        elif isinstance(node, ast.ImportFrom):
            assert node.level == 0, f"{file} line {node.lineno}: a relative import"
            module = node.module or ""
            found.add(module)
            found.update(f"{module}.{alias.name}" for alias in node.names)
    return found


def own_room(file: Path) -> str:
    return file.relative_to(PACKAGE).with_suffix("").parts[0]


def rooms_imported(file: Path) -> set[str]:
    return {room_of(name) for name in imported_by(file) if name.split(".")[0] == "fourcount"} & ROOMS


@pytest.mark.parametrize("file", FILES, ids=lambda file: str(file.relative_to(PACKAGE)))
def test_a_room_imports_only_what_it_was_built_on(file: Path) -> None:
    """A file imports from its own room and from those its room may know."""
    room = own_room(file)
    assert rooms_imported(file) <= MAY_IMPORT[room] | {room}


@pytest.mark.parametrize("file", FILES, ids=lambda file: str(file.relative_to(PACKAGE)))
def test_nobody_imports_what_is_slow_or_leaves_the_machine(file: Path) -> None:
    """Neither scipy.stats, scipy.optimize, pyplot nor anything that opens a connection is imported anywhere."""
    names = imported_by(file)
    assert not [name for name in names for banned in NOBODY_IMPORTS if name == banned or name.startswith(banned + ".")]


@pytest.mark.parametrize("file", FILES, ids=lambda file: str(file.relative_to(PACKAGE)))
def test_qt_stays_in_ink_and_face(file: Path) -> None:
    """Only the two rooms that paint import PySide6."""
    uses_qt = any(name.split(".")[0] in ("PySide6", "shiboken6") for name in imported_by(file))
    assert not uses_qt or own_room(file) in ("ink", "face")


def test_one_file_knows_matplotlib() -> None:
    """Only the pen of the curve imports matplotlib, and only inside its functions: nothing else waits for it."""
    users = [file for file in FILES if any(name.split(".")[0] == "matplotlib" for name in imported_by(file))]
    assert users == [PACKAGE / "ink" / "curve.py"]
    outside = ast.parse(users[0].read_text(encoding="utf-8")).body
    loaded = [node for node in outside if isinstance(node, ast.Import | ast.ImportFrom)]
    assert "matplotlib" not in " ".join(ast.unparse(node) for node in loaded)


def test_only_stats_computes_with_arrays() -> None:
    """Only stats imports numpy or scipy, so that a figure can change in no other room."""
    users = {own_room(file) for file in FILES for name in imported_by(file) if name.split(".")[0] in ("numpy", "scipy")}
    assert users <= {"stats", "face"}  # face only loads them ahead of need


def test_the_walk_sees_imports_inside_functions(tmp_path: Path) -> None:
    """An import hidden in a function counts like any other."""
    file = tmp_path / "hidden.py"
    file.write_text("def f():\n    from fourcount.stats import risk\n", encoding="utf-8")
    assert rooms_imported(file) == {"stats"}
