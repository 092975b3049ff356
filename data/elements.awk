# Makes src/core/element_table.inc from data/elements.tsv: one initialiser a row.
# Columns are found by their header, so that a column may be added anywhere.
BEGIN { FS = "\t" }
function num(name, scale,    v) { v = $(col[name]); return (v == "NA" || v == "") ? "0" : sprintf("%.10g", v * scale) }
NR == 1 { for (i = 1; i <= NF; i++) col[$i] = i; next }
{
    valence = $(col["lewis_valence_electrons"])
    if (valence == "NA") valence = $(col["outer_s_plus_d_electrons"])
    if (valence == "NA") valence = -1
    weight = $(col["atomic_weight_abridged2021"]); gsub(/[][]/, "", weight)
    printf "{%d, \"%s\", \"%s\", %d, %d, '%s', %d, %s, %s, %d, %s, %s, %s, %s, %s, %s},\n",
        $(col["Z"]), $(col["symbol"]), $(col["name"]), ($(col["group"]) == "NA") ? 0 : $(col["group"]), $(col["period"]),
        $(col["block"]), valence, num("en_pauling_allred", 1), weight, $(col["isotope_A"]), num("isotope_mass_u", 1),
        num("r1_pyykko_single_pm", 0.01), num("r2_pyykko_double_pm", 0.01), num("r3_pyykko_triple_pm", 0.01),
        num("r_cordero2008_pm", 0.01), num("vdw_alvarez2013_pm", 0.01)
}
