#include <fmt/core.h>

#include "rainledger/reference/antecedent.hpp"
#include "report/lookup_find.hpp"
#include "report/lookup_parts.hpp"

// Curve numbers for antecedent runoff conditions I and III.
namespace rainledger {
namespace {

constexpr std::string_view kHeading = "Curve numbers by antecedent runoff condition";

RowView view_of_number(double condition_2) {
    const auto number = [](std::string_view key, std::string_view label, double figure) {
        return ValueView{key, label, {}, "", {figure, {}}};
    };
    return {"CN " + four_figures(condition_2),
            {number("condition_1", "condition I", antecedent_dry(condition_2)),
             number("condition_2", "condition II", condition_2),
             number("condition_3", "condition III", antecedent_wet(condition_2))},
            {},
            antecedent_provenance(condition_2)};
}

constexpr std::string_view kMeaning =
    "Condition II is what the tables of cover give; I is drier and III wetter than usual before "
    "the storm. Between rows the table is read linearly.";

LookupAnswer whole_table() {
    LookupSection section{std::string(kHeading), {}, {}, {std::string(kMeaning)}, {}};
    for (const AntecedentRow& row : antecedent_table())
        section.rows.push_back(view_of_number(row.condition_2));
    return answered(std::move(section));
}

}  // namespace

LookupAnswer look_up_antecedent(const LookupAsked& asked) {
    if (asked.name.empty()) return whole_table();
    const ParsedQuantity parsed = parse_bare_number(asked.name);
    if (!parsed.value || !(*parsed.value > 0.0 && *parsed.value <= 100.0))
        return refused(
            in_quotes(asked.name) + " is no curve number; it must be above 0 and at most 100",
            "write it as 'rainledger lookup antecedent 61'");
    const RowView view = view_of_number(*parsed.value);
    const auto figure = [&](std::string_view key) {
        return four_figures(*value_of(view, key).published.value);
    };
    LookupSection section{std::string(kHeading), {view}, {}, {std::string(kMeaning)}, {}};
    section.yaml = yaml_comment(fmt::format("antecedent: I makes {} of it, III makes {}: {}",
                                            figure("condition_1"), figure("condition_3"),
                                            short_citation(view.provenance))) +
                   fmt::format("losses:\n  curve_number: {{number: {}, antecedent: III}}\n",
                               figure("condition_2"));
    return answered(std::move(section));
}

}  // namespace rainledger
