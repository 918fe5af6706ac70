"""The commands of tests/reference, which are files of no package, as modules that tests can call."""

from __future__ import annotations

import importlib.util
import sys
from pathlib import Path
from types import ModuleType


def reference_command(name: str) -> ModuleType:
    """The command ``name``, loaded under a name of its own: "coverage" is a library's too."""
    file = Path(__file__).parent / "reference" / f"{name}.py"
    specification = importlib.util.spec_from_file_location(f"reference_{name}", file)
    assert specification is not None
    assert specification.loader is not None
    module = importlib.util.module_from_spec(specification)
    sys.modules[specification.name] = module
    specification.loader.exec_module(module)
    return module
