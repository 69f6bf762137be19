#include "rainledger/reference/provenance.hpp"

#include <algorithm>
#include <set>
#include <string>
#include <vector>

#include "rainledger/base/whole_file.hpp"
#include "rainledger/reference/antecedent.hpp"
#include "rainledger/reference/composite_number.hpp"
#include "rainledger/reference/cover_numbers.hpp"
#include "rainledger/reference/horton_values.hpp"
#include "rainledger/reference/interception_values.hpp"
#include "rainledger/reference/pedotransfer.hpp"
#include "rainledger/reference/soil_group.hpp"
#include "rainledger/reference/soil_texture.hpp"
#include "rainledger/reference/steady_rates.hpp"
#include "rainledger/reference/storage_values.hpp"
#include "rainledger/reference/texture_triangle.hpp"
#include "reference/sources.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

template <typename Row>
void add_views(std::vector<RowView>& views, std::span<const Row> rows) {
    for (const Row& row : rows)
        views.push_back(view_of(row));
}

std::vector<RowView> all_rows() {
    std::vector<RowView> views;
    add_views(views, green_ampt_textures());
    add_views(views, soil_water_textures());
    add_views(views, soil_group_rows());
    add_views(views, cover_rows());
    add_views(views, horton_rows());
    add_views(views, storage_rows());
    add_views(views, interception_rows());
    add_views(views, steady_rate_rows());
    views.push_back(view_of(*rawls_brakensiek_soil({40.0, 20.0}, 0.45).value));
    views.push_back(view_of(*saxton_rawls_soil({40.0, 20.0}, 2.5).value));
    return views;
}

std::vector<Provenance> all_provenances() {
    std::vector<Provenance> all{
        texture_triangle_provenance(), bouwer_share_provenance(),
        texture_key_provenance(),      paved_depression_provenance(),
        antecedent_provenance(61.0),   composite_number({74.0, 0.2, 0.5}).value->provenance};
    for (const RowView& view : all_rows())
        all.push_back(view.provenance);
    return all;
}

}  // namespace

TEST_CASE("every row has a source on the list, and every source on the list has a row") {
    std::set<const Source*> used;
    for (const Provenance& provenance : all_provenances()) {
        REQUIRE(provenance.source != nullptr);
        CHECK_FALSE(provenance.place.empty());
        used.insert(provenance.source);
    }
    const std::set<const Source*> listed(sources::kAll.begin(), sources::kAll.end());
    CHECK(listed.size() == sources::kAll.size());
    CHECK(used == listed);
}

TEST_CASE("every source has an entry among the references") {
    std::string problem;
    const auto references =
        read_whole_file(RAINLEDGER_SOURCE_FOLDER "/docs/references.md", problem);
    REQUIRE(references);
    for (const Source* source : sources::kAll) {
        CHECK_THAT(*references, Contains("**" + std::string(source->key) + "**"));
        CHECK_FALSE(source->author.empty());
        CHECK_FALSE(source->title.empty());
        CHECK_FALSE(source->year.empty());
    }
}

TEST_CASE("every value of every row can be shown, in canonical and in printed units") {
    for (const RowView& view : all_rows()) {
        INFO(view.name);
        CHECK_FALSE(view.name.empty());
        std::set<std::string_view> keys;
        for (const ValueView& value : view.values) {
            INFO(value.key);
            CHECK(keys.insert(value.key).second);
            CHECK_FALSE(value.label.empty());
            const auto& [figure, range] = value.published;
            if (range) CHECK(range->low <= range->high);
            if (figure && range) CHECK((*figure >= range->low && *figure <= range->high));
            if (value.dimension && (figure || range))
                CHECK(find_unit(value.printed_unit, *value.dimension));
        }
    }
}

TEST_CASE("a citation says author, title, year, edition, place and status") {
    CHECK(citation(bouwer_share_provenance()) ==
          "Bouwer: Rapid field measurement of air entry value and hydraulic conductivity of soil, "
          "1966, Water Resources Research 2(4), conductivity behind a wetting front, about half Ks "
          "(from memory)");
    CHECK(citation(saxton_rawls_provenance()) ==
          "Saxton and Rawls: Soil water characteristic estimates by texture and organic matter for "
          "hydrologic solutions, 2006, Soil Science Society of America Journal 70:1569-1578, "
          "equations 1 to 6, 15, 16 and 18 (from memory; they return all twelve rows of table 3, "
          "which does not hold the air entry)");
    CHECK(status_words(Status::confirmed) == "confirmed");
    CHECK(status_words(Status::common_practice) == "common practice");
}

}  // namespace rainledger
