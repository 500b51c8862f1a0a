"""Writes wanelaw/exact_tables.py from the tables of package num, so that both
look up the same bits. Run by go generate."""

import os
import re
import sys

HERE = os.path.dirname(os.path.abspath(__file__))
NUM = os.path.join(HERE, "..", "..", "..", "..", "sim", "num")
HEX = r"-?0x[0-9a-f.]+p[+-]\d+"


def rows(source, name):
    body = re.search(r"var %s = .*?\{\n(.*?)\n\}" % name, source, re.S).group(1)
    return re.findall(r"\{([^}]*)\}", body)


def constant(source, name):
    return re.search(r"%s\s*=\s*(%s)" % (name, HEX), source).group(1)


def main(out):
    with open(os.path.join(NUM, "exp_table.go")) as f:
        exp = f.read()
    with open(os.path.join(NUM, "log_table.go")) as f:
        log = f.read()
    print('"""Tables of exact.py. Made by testdata/make_tables.py from those of package num; do not edit."""\n', file=out)
    print("# Of 2^(i/128): the bits of the nearest double less i 2^45, and the relative rest.", file=out)
    print('EXP = """', file=out)
    for row in rows(exp, "expTable"):
        print(row.replace(",", ""), file=out)
    print('"""', file=out)
    for name, two in (("log", "lnTwo"), ("log10", "log10Two")):
        print("\n# %s of 2 in two parts; reciprocals, and minus their %s in two parts." % (name, name), file=out)
        print('%s_TWO = ("%s", "%s")' % (name.upper(), constant(log, two + "High"), constant(log, two + "Low")), file=out)
        print('%s = """' % name.upper(), file=out)
        for row in rows(log, name + "Table"):
            print(" ".join(re.findall(HEX, row)[:3]), file=out)
        print('"""', file=out)


if __name__ == "__main__":
    if sys.argv[1:] == ["-"]:
        main(sys.stdout)
    else:
        with open(os.path.join(HERE, "..", "wanelaw", "exact_tables.py"), "w") as f:
            main(f)
