"""CODATA tables as SciPy keeps them (scipy.constants._codata, the published text). Run: python3 generate.py > values.csv"""
import scipy
from scipy.constants import _codata as tables

NAMES = {
    "PLANCK_CONSTANT": "Planck constant",
    "REDUCED_PLANCK_CONSTANT": "reduced Planck constant",
    "SPEED_OF_LIGHT": "speed of light in vacuum",
    "BOLTZMANN_CONSTANT": "Boltzmann constant",
    "ELEMENTARY_CHARGE": "elementary charge",
    "AVOGADRO_CONSTANT": "Avogadro constant",
    "MOLAR_GAS_CONSTANT": "molar gas constant",
    "ATOMIC_MASS_CONSTANT": "atomic mass constant",
    "ELECTRIC_CONSTANT": "vacuum electric permittivity",
    "ELECTRON_MASS": "electron mass",
    "BOHR_RADIUS": "Bohr radius",
    "HARTREE_ENERGY": "Hartree energy",
    "BOHR_MAGNETON": "Bohr magneton",
    "ATOMIC_UNIT_OF_POLARIZABILITY": "atomic unit of electric polarizability",
    "ATOMIC_UNIT_OF_DIPOLE_MOMENT": "atomic unit of electric dipole mom.",
}
print("# SciPy %s" % scipy.__version__)
print("year,name,value,uncertainty,exact")
for year, table in (("2018", tables._physical_constants_2018), ("2022", tables._physical_constants_2022)):
    for name, title in NAMES.items():
        value, _, uncertainty = table[title]
        print("%s,%s,%r,%r,%s" % (year, name, value, uncertainty, uncertainty == 0))
