"""Start Fourcount from its source tree, on a machine that has nothing but Python.

    python3 packaging/start.py [what the command takes]
    python3 packaging/start.py --prepare        make everything ready, open nothing

The first start makes an environment and installs the locked libraries into it; later ones open at once.
"""

from __future__ import annotations

import os
import subprocess
import sys

import setup_environment
import system_needs


def main(arguments: list[str]) -> int:
    try:
        _make_ready(arguments)
    except system_needs.SetUpError as reason:
        _say(str(reason))
        return 1
    except KeyboardInterrupt:
        _say("Stopped; nothing half-made was left.")
        return 130
    return 0 if arguments == ["--prepare"] else _hand_over(arguments)


def _make_ready(arguments: list[str]) -> None:
    system_needs.require_python(sys.version_info[:3], "packaging/start.py")
    if _opens_window(arguments):
        system_needs.require_screen(os.environ, sys.platform)
    ready = setup_environment.is_ready(setup_environment.TO_RUN)

    def look() -> list[system_needs.Need]:
        libraries = system_needs.missing_libraries(_libraries(arguments))
        return libraries if ready else system_needs.missing_venv() + libraries

    system_needs.require(look, _say)
    if not ready:
        setup_environment.make_ready(setup_environment.TO_RUN, _say)


def _opens_window(arguments: list[str]) -> bool:
    if arguments and arguments[0] in ("answer", "handout", "--prepare"):
        return False
    return not {"-h", "--help", "--version"}.intersection(arguments)


def _libraries(arguments: list[str]) -> tuple[system_needs.Need, ...]:
    """The command's figures need no library of the system, its handout those for painting, a window all."""
    if arguments[:1] == ["handout"]:
        return system_needs.painting_libraries(sys.platform)
    if _opens_window(arguments) or arguments[:1] == ["--prepare"]:
        return system_needs.window_libraries(os.environ, sys.platform)
    return ()


def _hand_over(arguments: list[str]) -> int:
    """Become the program. ``-P`` keeps the folder one stands in from being imported from."""
    python = str(setup_environment.python_of(setup_environment.FOLDER))
    command = [python, "-P", "-m", "fourcount", *arguments]
    if os.name != "nt":  # exec there returns to the prompt while the program still runs
        os.execv(python, command)
    return subprocess.call(command)


def _say(line: str) -> None:
    print(line, file=sys.stderr, flush=True)  # standard output is the command's own


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
