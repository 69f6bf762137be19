#include <algorithm>

#include "rainledger/reference/storage_values.hpp"
#include "report/lookup_find.hpp"
#include "report/lookup_parts.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kHeading = "Depression storage and surface retention";
constexpr std::string_view kRetention =
    "Surface retention holds interception as well: set no interception beside it.";

std::string storage_yaml(const RowView& view, StorageKind kind) {
    const ValueView& value = view.values.front();
    std::string words = view.name + ": " + short_citation(view.provenance);
    if (kind == StorageKind::retention) words += "; holds interception as well";
    return yaml_comment(words) +
           "depression_storage: " + as_printed(*value.published.value, value) + "\n";
}

/// A paved surface by its slope.
LookupAnswer paved(const LookupAsked& asked) {
    const auto depth = paved_depression_storage_mm(*asked.slope_percent);
    if (!depth.value) return refused(depth.problem, depth.hint);
    RowView view{"paved surface at a slope of " + four_figures(*asked.slope_percent) + " %",
                 {{"depression_storage_mm",
                   storage_kind_name(StorageKind::depression),
                   Dimension::depth,
                   "mm",
                   {*depth.value, {}}}},
                 {"0.77 S^-0.49 mm, the slope S in percent"},
                 paved_depression_provenance()};
    LookupSection section{"Depression storage", {view}, {}, {}, {}};
    section.yaml = yaml_comment(view.name + ": " + short_citation(view.provenance)) +
                   "depression_storage: " + four_figures(*depth.value) + " mm\n";
    return answered(std::move(section));
}

void add_advice(LookupSection& section, const std::vector<const StorageRow*>& rows) {
    const auto retains = [](const StorageRow* row) { return row->kind == StorageKind::retention; };
    if (std::ranges::any_of(rows, retains)) section.lines.emplace_back(kRetention);
    section.lines.emplace_back(
        "Curve numbers hold depression storage already; with them none is set.");
    if (rows.size() > 1)
        section.lines.emplace_back(
            "One row by name makes a fragment; --slope '2 %' asks for a "
            "paved surface of that slope.");
}

}  // namespace

LookupAnswer look_up_storage(const LookupAsked& asked) {
    if (asked.slope_percent && !asked.name.empty())
        return refused("--slope asks for a paved surface and takes no name");
    if (asked.slope_percent) return paved(asked);
    const auto rows = rows_asked(storage_rows(), "storage", asked.name);
    if (!rows.value) return refused(rows.problem, rows.hint);
    LookupSection section{std::string(kHeading), views_of(*rows.value), {}, {}, {}};
    if (rows.value->size() == 1) {
        const StorageRow& row = *rows.value->front();
        if (row.depth_mm.value)
            section.yaml = storage_yaml(section.rows.front(), row.kind);
        else
            section.lines.emplace_back("The source gives a range alone; where in it is yours.");
    }
    add_advice(section, *rows.value);
    add_line(section, others_line(storage_rows(), *rows.value, asked.name));
    return answered(std::move(section));
}

}  // namespace rainledger
