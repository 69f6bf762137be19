#include <algorithm>

#include <fmt/core.h>

#include "rainledger/reference/composite_number.hpp"
#include "report/lookup_find.hpp"
#include "report/lookup_parts.hpp"

namespace rainledger {
namespace {

using Rows = std::vector<const CoverRow*>;

constexpr std::string_view kMeaning =
    "The numbers are for antecedent condition II and an initial abstraction of 0.2 S; they stand "
    "for interception and depression storage as well, so that neither is set beside them.";

/// The rows that fit everything asked; where none does, the reference room says why.
Answer<Rows> covers_asked(const LookupAsked& asked) {
    auto rows = rows_asked(cover_rows(), "cover", asked.name);
    if (!rows.value) return rows;
    const Rows named = *rows.value;
    if (asked.treatment)
        std::erase_if(*rows.value, [&](const CoverRow* row) {
            return !same_name(row->treatment, *asked.treatment);
        });
    if (asked.condition)
        std::erase_if(*rows.value,
                      [&](const CoverRow* row) { return row->condition != *asked.condition; });
    if (!rows.value->empty()) return rows;
    const auto why =
        find_cover({named.front()->name, asked.treatment ? std::string_view(*asked.treatment) : "",
                    asked.condition});
    return refusal<Rows>(
        why.problem.empty() ? "no row of that name has that treatment and condition" : why.problem,
        why.hint);
}

std::string number_yaml(const std::string& comment, double number) {
    return yaml_comment(comment) + "losses:\n  curve_number: {number: " + four_figures(number) +
           "}\n";
}

/// Fills in what a group makes of the row. Where water stands high and no drains lower it, a dual
/// group is D.
Answer<int> add_group(LookupSection& section, const CoverRow& row, const SoilGroupRating& group) {
    const auto drained = cover_number(row, group.drained);
    if (!drained.value) return drained;
    const auto undrained = cover_number(row, group.undrained);
    if (!undrained.value) return undrained;
    const std::string name = rating_name(group);
    std::string comment = fmt::format("{}, group {}: {}", section.rows.front().name, name,
                                      short_citation(row.provenance));
    section.answer = fmt::format("{} for group {}", *undrained.value, name);
    if (group.dual()) {
        section.answer = fmt::format("{} not drained, {} drained, for group {}", *undrained.value,
                                     *drained.value, name);
        comment += fmt::format("; not drained; drained: {}", *drained.value);
    }
    section.yaml = number_yaml(comment, *undrained.value);
    return undrained;
}

LookupSection composite_section(const CoverRow& row, int pervious, const CompositeNumber& made,
                                const LookupAsked& asked) {
    const double share = *asked.impervious_share;
    const double connected = asked.connected_share.value_or(1.0);
    const std::string parts =
        fmt::format("{} % impervious, {} % of it connected", four_figures(100.0 * share),
                    four_figures(100.0 * connected));
    const std::string name = view_of(row).name + ", " + parts;
    RowView view{
        name,
        {{"curve_number", "composite curve number", {}, "", {made.number, {}}},
         {"pervious_number", "of the pervious part", {}, "", {static_cast<double>(pervious), {}}},
         {"impervious_number", "of the impervious part", {}, "", {kImperviousNumber, {}}}},
        {},
        made.provenance};
    LookupSection section{"Composite curve number", {view}, four_figures(made.number), {}, {}};
    if (connected < 1.0 && share >= kLeastShareAsConnected)
        section.lines.emplace_back(
            "From 30 % impervious on, figure 2-4 does not hold and figure 2-3 is used: all counts "
            "as connected.");
    section.lines.emplace_back(
        "Surfaces of their own, the impervious one running onto the pervious one, follow the water "
        "closer than one number for both.");
    section.yaml = number_yaml(name + ": " + short_citation(made.provenance), made.number);
    return section;
}

/// What does not go together in a question about one row.
LookupAnswer composite_problem(const LookupAsked& asked, const Rows& rows) {
    if (asked.connected_share && !asked.impervious_share)
        return refused("--connected is the share of the impervious area; add --impervious '65 %'");
    if (!asked.impervious_share) return {};
    if (rows.size() > 1)
        return refused(
            "--impervious needs one pervious cover, and " + std::to_string(rows.size()) + " fit",
            "name it whole, with --condition and --treatment where it has them");
    const CoverRow& row = *rows.front();
    if (row.impervious_percent)
        return refused(fmt::format("the numbers of {} hold an impervious area of {} % already",
                                   row.name, *row.impervious_percent),
                       "name the pervious cover, such as 'open space'");
    if (!asked.soil_group) return refused("--impervious needs --soil-group A, B, C or D as well");
    return {};
}

LookupAnswer one_cover(const LookupAsked& asked, const Rows& rows) {
    const CoverRow& row = *rows.front();
    LookupSection section{"Curve numbers by cover and soil group", {view_of(row)}, {}, {}, {}};
    section.lines.emplace_back(kMeaning);
    if (!asked.soil_group) {
        section.lines.emplace_back("--soil-group B picks a number and makes a fragment of it.");
        return answered(std::move(section));
    }
    const auto number = add_group(section, row, *asked.soil_group);
    if (!number.value) return refused(number.problem, number.hint);
    std::vector<LookupSection> sections{std::move(section)};
    if (asked.impervious_share) {
        const auto made =
            composite_number({static_cast<double>(*number.value), *asked.impervious_share,
                              asked.connected_share.value_or(1.0)});
        if (!made.value) return refused(made.problem, made.hint);
        sections.front().yaml.clear();
        sections.push_back(composite_section(row, *number.value, *made.value, asked));
    }
    return {std::move(sections), {}, {}};
}

}  // namespace

LookupAnswer look_up_cover(const LookupAsked& asked) {
    const auto rows = covers_asked(asked);
    if (!rows.value) return refused(rows.problem, rows.hint);
    if (auto problem = composite_problem(asked, *rows.value); !problem.problem.empty())
        return problem;
    if (rows.value->size() == 1) return one_cover(asked, *rows.value);
    LookupSection section{
        "Curve numbers by cover and soil group", views_of(*rows.value), {}, {}, {}};
    section.lines.emplace_back(kMeaning);
    add_line(section, others_line(cover_rows(), *rows.value, asked.name));
    section.lines.emplace_back(
        "One row, chosen by name, --condition and --treatment, with --soil-group B, makes a "
        "fragment for a scenario.");
    return answered(std::move(section));
}

}  // namespace rainledger
