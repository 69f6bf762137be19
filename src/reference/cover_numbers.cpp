#include "rainledger/reference/cover_numbers.hpp"

#include <algorithm>
#include <cstddef>
#include <string>
#include <vector>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/suggest.hpp"
#include "rainledger/reference/names.hpp"

namespace rainledger {
namespace {

constexpr std::array<std::string_view, 4> kConditionNames{"", "poor", "fair", "good"};

using Rows = std::vector<const CoverRow*>;

void add_once(std::vector<std::string_view>& names, std::string_view name) {
    if (std::find(names.begin(), names.end(), name) == names.end()) names.push_back(name);
}

std::string listed(const std::vector<std::string_view>& names) {
    std::string out;
    for (const std::string_view name : names) {
        if (!out.empty()) out += "; ";
        out += name;
    }
    return out;
}

std::vector<std::string_view> treatments_of(const Rows& rows) {
    std::vector<std::string_view> names;
    for (const CoverRow* row : rows)
        if (!row->treatment.empty()) add_once(names, row->treatment);
    return names;
}

std::vector<std::string_view> conditions_of(const Rows& rows) {
    std::vector<std::string_view> names;
    for (const CoverRow* row : rows)
        if (row->condition != HydrologicCondition::none)
            add_once(names, condition_name(row->condition));
    return names;
}

Answer<const CoverRow*> unknown_cover(std::string_view typed) {
    const Rows near = rows_mentioning(cover_rows(), typed);
    std::vector<std::string_view> names;
    for (const CoverRow* row : near)
        add_once(names, row->name);
    const std::string problem = "unknown cover " + in_quotes(typed);
    if (!names.empty())
        return refusal<const CoverRow*>(problem, "covers of that kind: " + listed(names));
    return refusal<const CoverRow*>(problem, suggestion(typed, names_of(cover_rows())));
}

/// What is wrong with the treatment asked for, among the rows of one cover; `rows` is left with
/// those of that treatment.
Answer<const CoverRow*> pick_treatment(Rows& rows, const CoverAsked& asked) {
    const auto known = treatments_of(rows);
    const std::string cover(rows.front()->name);
    if (known.empty()) {
        if (asked.treatment.empty()) return {};
        return refusal<const CoverRow*>("the tables know no treatment of " + cover);
    }
    if (asked.treatment.empty())
        return refusal<const CoverRow*>(cover + " needs a treatment", "one of: " + listed(known));
    std::erase_if(rows,
                  [&](const CoverRow* row) { return !same_name(row->treatment, asked.treatment); });
    if (!rows.empty()) return {};
    const auto near = nearest(asked.treatment, known);
    return refusal<const CoverRow*>(
        "unknown treatment " + in_quotes(asked.treatment) + " of " + cover,
        near ? "did you mean " + in_quotes(*near) + "?" : "one of: " + listed(known));
}

/// The same for the condition.
Answer<const CoverRow*> pick_condition(Rows& rows, const CoverAsked& asked) {
    const auto known = conditions_of(rows);
    std::string cover(rows.front()->name);
    if (!rows.front()->treatment.empty()) cover += ", " + std::string(rows.front()->treatment);
    const bool given = asked.condition && *asked.condition != HydrologicCondition::none;
    if (known.empty()) {
        if (!given) return {};
        return refusal<const CoverRow*>("the tables make no difference of condition for " + cover);
    }
    const std::string hint = "one of: " + listed(known);
    if (!given) return refusal<const CoverRow*>(cover + " needs a condition", hint);
    std::erase_if(rows, [&](const CoverRow* row) { return row->condition != *asked.condition; });
    if (!rows.empty()) return {};
    return refusal<const CoverRow*>("the tables have no condition '" +
                                        std::string(condition_name(*asked.condition)) + "' of " +
                                        cover,
                                    hint);
}

std::string full_name(const CoverRow& row) {
    std::string name(row.name);
    if (!row.treatment.empty()) name += ", " + std::string(row.treatment);
    const std::string_view condition = condition_name(row.condition);
    if (!condition.empty()) name += ", " + std::string(condition) + " condition";
    return name;
}

}  // namespace

std::string_view condition_name(HydrologicCondition condition) {
    return kConditionNames[static_cast<std::size_t>(condition)];
}

std::optional<HydrologicCondition> find_condition(std::string_view typed) {
    const auto at = find_name(typed, kConditionNames);
    if (!at) return std::nullopt;
    return static_cast<HydrologicCondition>(*at);
}

Answer<const CoverRow*> find_cover(const CoverAsked& asked) {
    Rows rows = rows_named(cover_rows(), asked.name);
    if (rows.empty()) return unknown_cover(asked.name);
    if (auto refused = pick_treatment(rows, asked); !refused.problem.empty()) return refused;
    if (auto refused = pick_condition(rows, asked); !refused.problem.empty()) return refused;
    return {rows.front(), {}, {}};
}

Answer<int> cover_number(const CoverRow& row, SoilGroup group) {
    const auto& number = row.numbers[static_cast<std::size_t>(group)];
    if (number) return {*number, {}, {}};
    return refusal<int>("the table has no number of " + full_name(row) + " on soil group " +
                        std::string(soil_group_name(group)));
}

RowView view_of(const CoverRow& row) {
    RowView view{full_name(row), {}, {}, row.provenance};
    constexpr std::array<std::string_view, 4> kKeys{"curve_number_a", "curve_number_b",
                                                    "curve_number_c", "curve_number_d"};
    constexpr std::array<std::string_view, 4> kLabels{"group A", "group B", "group C", "group D"};
    for (std::size_t i = 0; i < kKeys.size(); ++i) {
        PublishedValue cell;
        if (row.numbers[i]) cell.value = static_cast<double>(*row.numbers[i]);
        view.values.push_back({kKeys[i], kLabels[i], {}, "", cell});
    }
    if (row.impervious_percent)
        view.values.push_back({"impervious_percent",
                               "average impervious area, held already, %",
                               {},
                               "",
                               {static_cast<double>(*row.impervious_percent), {}}});
    if (!row.note.empty()) view.notes.push_back(row.note);
    return view;
}

}  // namespace rainledger
