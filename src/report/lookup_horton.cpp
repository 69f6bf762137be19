#include <array>

#include "rainledger/reference/horton_values.hpp"
#include "report/lookup_find.hpp"
#include "report/lookup_parts.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kMeaning =
    "Capacities after Horton are for the soil as it was tested, ponded. The sources here differ by "
    "more than ten times: a test on the site goes before any of them.";

struct Parameter {
    std::string_view key;   // of the row
    std::string_view name;  // in a scenario
};
constexpr std::array kParameters{Parameter{"initial_capacity_mm_per_h", "initial_capacity"},
                                 Parameter{"final_capacity_mm_per_h", "final_capacity"},
                                 Parameter{"decay_per_h", "decay"}};

/// What a row lacks to make a law: "final capacity (a range alone), decay"; empty if nothing.
std::string lacking(const RowView& view) {
    std::string out;
    for (const Parameter& parameter : kParameters) {
        const ValueView& value = value_of(view, parameter.key);
        if (value.published.value) continue;
        if (!out.empty()) out += ", ";
        out += value.label;
        if (value.published.range) out += " (a range alone)";
    }
    return out;
}

std::string horton_yaml(const RowView& view) {
    std::string out = yaml_comment(view.name + ", as printed: " + short_citation(view.provenance));
    for (const std::string_view note : view.notes)
        out += yaml_comment(note);
    out += "losses:\n  horton:\n";
    for (const Parameter& parameter : kParameters) {
        const ValueView& value = value_of(view, parameter.key);
        out += "    " + std::string(parameter.name) + ": " +
               as_printed(*value.published.value, value) + "\n";
    }
    return out;
}

}  // namespace

LookupAnswer look_up_horton(const LookupAsked& asked) {
    const auto rows = rows_asked(horton_rows(), "horton", asked.name);
    if (!rows.value) return refused(rows.problem, rows.hint);
    LookupSection section{
        "Horton's parameters by soil and cover", views_of(*rows.value), {}, {}, {}};
    section.lines.emplace_back(kMeaning);
    if (rows.value->size() == 1) {
        const RowView& view = section.rows.front();
        const std::string missing = lacking(view);
        if (missing.empty())
            section.yaml = horton_yaml(view);
        else
            section.lines.push_back("The row makes no whole law; it lacks: " + missing + ".");
    } else {
        section.lines.emplace_back(
            "One row by name that has all three makes a fragment for a scenario.");
    }
    add_line(section, others_line(horton_rows(), *rows.value, asked.name));
    return answered(std::move(section));
}

}  // namespace rainledger
