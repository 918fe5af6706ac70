"""The entries of what stands beside the measures, and the keys of every gap."""

from __future__ import annotations

import ast
import subprocess
import sys
from pathlib import Path

from fourcount import stats
from fourcount.stats.methods import EXTRAS
from fourcount.stats.results import GAP_KEYS

FOLDER = Path(str(stats.__file__)).parent

WITHOUT_NUMPY = """
import sys
from fourcount.stats import attributable, clusters, e_value, fragility, losses, methods
print(sorted({name.split(".")[0] for name in sys.modules} & {"numpy", "scipy"}))
"""


def test_every_entry_says_what_it_is() -> None:
    """Each key stands once, and title, formula, source and note are there."""
    keys = [entry.key for entry in EXTRAS]
    assert len(keys) == len(set(keys))
    assert {
        "attributable-exposed",
        "attributable-population",
        "e-value",
        "fragility",
        "losses",
        "design-effect",
    } <= set(keys)
    for entry in EXTRAS:
        assert all((entry.title, entry.formula, entry.source, entry.note)), entry.key


def test_every_gap_has_a_listed_key() -> None:
    """Whatever reason a function of stats writes down stands in the list for which sentences are held."""
    used = {
        node.args[0].value
        for file in FOLDER.rglob("*.py")
        for node in ast.walk(ast.parse(file.read_text(encoding="utf-8")))
        if isinstance(node, ast.Call)
        and isinstance(node.func, ast.Name)
        and node.func.id == "Gap"
        and isinstance(node.args[0], ast.Constant)
    }
    assert used <= set(GAP_KEYS)
    assert {"fragility-not-below", "icc-out-of-range", "ratio-below-one", "not-whole", "too-few-left"} <= used


def test_importing_them_loads_no_numpy() -> None:
    """Fragility, losses, clusters, E-value and fractions can be imported before the window paints."""
    found = subprocess.run([sys.executable, "-c", WITHOUT_NUMPY], capture_output=True, text=True, check=True)
    assert found.stdout.strip() == "[]"
