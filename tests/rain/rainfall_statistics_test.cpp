#include "rainledger/rain/rainfall_statistics.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <limits>
#include <random>

#include "rain/statistics_helpers.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

constexpr double kRounding = 1e-13;

/// 1, 2 and 10 years.
RainfallStatistics with_one_year() {
    return {{1.0, 4.0}, {1.0, 2.0, 10.0}, {20.0, 25.0, 40.0, 30.0, 36.0, 60.0}, {}};
}

RainfallStatistics single_list() {
    return {{0.5, 1.0}, {}, {20.0, 26.0}, {}};
}

/// A table of up to 8 by 8 whose depths rise or stay equal.
RainfallStatistics random_table(std::mt19937& random) {
    const auto rise = [&] { return static_cast<double>(random() % 4) * 0.1; };
    RainfallStatistics table;
    const std::size_t rows = 1 + random() % 8;
    const std::size_t columns = 1 + random() % 8;
    for (std::size_t i = 0; i < rows; ++i)
        table.duration_h.push_back((i == 0 ? 0.0 : table.duration_h.back()) + 0.25 + rise());
    for (std::size_t j = 0; j < columns; ++j)
        table.return_period_yr.push_back(j == 0 ? 1.5
                                                : table.return_period_yr.back() * (1.3 + rise()));
    for (std::size_t i = 0; i < rows; ++i)
        for (std::size_t j = 0; j < columns; ++j) {
            const double above = i == 0 ? 5.0 : table.at(i - 1, j);
            const double before = j == 0 ? 5.0 : table.depth_mm.back();
            table.depth_mm.push_back(std::fmax(above, before) * (1.0 + rise()));
        }
    return table;
}

}  // namespace

TEST_CASE("the Gumbel variate is that of its definition") {
    CHECK_THAT(gumbel_variate(2.0), WithinRel(-std::log(std::log(2.0)), 1e-15));
    CHECK_THAT(gumbel_variate(100.0), WithinRel(-std::log(-std::log(0.99)), 1e-14));
    // For a long period it tends to ln T, where 1 - 1/T would have lost its digits.
    CHECK_THAT(gumbel_variate(1e12), WithinRel(std::log(1e12), 1e-12));
}

TEST_CASE("a tabulated return period gives its column to the last bit") {
    const RainfallStatistics table = read_table(kCountyTable);
    for (std::size_t j = 0; j < table.columns(); ++j) {
        const ListAnswer answer = depths_of(table, table.return_period_yr[j]);
        REQUIRE(answer.list.has_value());
        CHECK(answer.list->duration_h == table.duration_h);
        for (std::size_t i = 0; i < table.duration_h.size(); ++i)
            CHECK(answer.list->depth_mm[i] == table.at(i, j));
    }
    CHECK(depths_of(table, 10.0 * (1.0 + 2e-16)).list->depth_mm[0] == 12.5);
}

TEST_CASE("between return periods log depth is linear in the Gumbel variate") {
    const RainfallStatistics table = read_table(kCountyTable);
    const ListAnswer answer = depths_of(table, 20.0);
    REQUIRE(answer.list.has_value());
    // 5 min by hand: y(10) = 2.250367, y(20) = 2.970195, y(25) = 3.198534,
    // share 0.759179, 12.5 (14.9 / 12.5)^0.759179 = 14.2829 mm.
    CHECK_THAT(answer.list->depth_mm[0], WithinAbs(14.2829, 0.0001));
    const double share = (gumbel_variate(20.0) - gumbel_variate(10.0)) /
                         (gumbel_variate(25.0) - gumbel_variate(10.0));
    for (std::size_t i = 0; i < table.duration_h.size(); ++i)
        CHECK_THAT(std::log(answer.list->depth_mm[i]),
                   WithinRel(std::log(table.at(i, 2)) +
                                 share * (std::log(table.at(i, 3)) - std::log(table.at(i, 2))),
                             kRounding));
}

TEST_CASE("a 1-year column is used as it stands and never interpolated from") {
    CHECK(depths_of(with_one_year(), 1.0).list->depth_mm == std::vector<double>{20.0, 30.0});
    const ListAnswer answer = depths_of(with_one_year(), 1.5);
    CHECK_FALSE(answer.list.has_value());
    CHECK(answer.problem ==
          "a return period of 1.5 yr lies between the table's columns for 1 yr and 2 yr, and "
          "nothing is interpolated from a 1-year column");
    CHECK(answer.hint == "choose one of 1 yr, 2 yr, 10 yr");
    CHECK(depths_of(with_one_year(), 2.5).list.has_value());
}

TEST_CASE("outside the table there are no depths") {
    const RainfallStatistics table = read_table(kCountyTable);
    for (const double years : {200.0, 1.5, 1.0, 0.5, -3.0})
        CHECK_FALSE(depths_of(table, years).list.has_value());
    const ListAnswer answer = depths_of(table, 200.0);
    CHECK(answer.problem ==
          "a return period of 200 yr lies outside the table, which goes from 2 yr to 100 yr");
    CHECK(answer.hint ==
          "choose one of 2 yr, 5 yr, 10 yr, 25 yr, 50 yr, 100 yr, or one between them");
    CHECK_FALSE(depths_of(with_one_year(), 0.5).list.has_value());
    const RainfallStatistics one_column{{1.0}, {10.0}, {41.0}, {}};
    CHECK(depths_of(one_column, 25.0).problem ==
          "a return period of 25 yr is not in the table, which holds 10 yr alone");
    CHECK(depths_of(one_column, 25.0).hint ==
          "choose that one, or a table with more return periods");
}

TEST_CASE("a return period that is no number is refused") {
    const RainfallStatistics table = read_table(kCountyTable);
    for (const double years :
         {std::numeric_limits<double>::quiet_NaN(), std::numeric_limits<double>::infinity()}) {
        CHECK(depths_of(table, years).problem == "a return period must be a finite number");
        CHECK(depths_of(table, years).hint ==
              "choose one of 2 yr, 5 yr, 10 yr, 25 yr, 50 yr, 100 yr, or one between them");
    }
}

TEST_CASE("the return period may be left out where there is one column alone") {
    CHECK(depths_of(single_list(), std::nullopt).list->depth_mm == std::vector<double>{20.0, 26.0});
    CHECK(single_list().columns() == 1);
    CHECK(single_list().at(1, 0) == 26.0);
    const RainfallStatistics one_column{{1.0}, {10.0}, {41.0}, {}};
    CHECK(depths_of(one_column, std::nullopt).list->depth_mm == std::vector<double>{41.0});
    const ListAnswer several = depths_of(with_one_year(), std::nullopt);
    CHECK(several.problem == "the table holds several return periods, and none is chosen");
    CHECK(several.hint == "choose one of 1 yr, 2 yr, 10 yr, or one between 2 yr and 10 yr");
    const RainfallStatistics two_columns{{1.0}, {1.0, 2.0}, {20.0, 41.0}, {}};
    CHECK(depths_of(two_columns, std::nullopt).hint == "choose one of 1 yr, 2 yr");
    CHECK(depths_of(two_columns, 5.0).hint == "choose one of 1 yr, 2 yr");
    const ListAnswer none = depths_of(single_list(), 10.0);
    CHECK(none.problem == "the table holds no return periods to choose from");
    CHECK(none.hint == "leave the return period out");
}

TEST_CASE("how rare a depth is: in a column, between two, and outside") {
    const RainfallStatistics table = read_table(kCountyTable);
    CHECK(rarity_of(table, 1.0, 41.0)->years == 10.0);
    const auto between = rarity_of(table, 1.0, 45.0);
    REQUIRE(between.has_value());
    REQUIRE(between->years.has_value());
    CHECK(*between->years > 10.0);
    CHECK(*between->years < 25.0);
    CHECK_FALSE(between->more_than.has_value());
    CHECK_FALSE(between->less_than.has_value());
    const auto rare = rarity_of(table, 1.0, 70.0);
    CHECK_FALSE(rare->years.has_value());
    CHECK(rare->more_than == 100.0);
    CHECK_FALSE(rare->less_than.has_value());
    const auto common = rarity_of(table, 1.0, 0.0);
    CHECK_FALSE(common->years.has_value());
    CHECK_FALSE(common->more_than.has_value());
    CHECK(common->less_than == 2.0);
    CHECK(rarity_of(table, 24.0, 131.1)->years == 100.0);
}

TEST_CASE("between a 1-year column and the next a depth has both limits") {
    const auto rarity = rarity_of(with_one_year(), 1.0, 22.0);
    REQUIRE(rarity.has_value());
    CHECK_FALSE(rarity->years.has_value());
    CHECK(rarity->more_than == 1.0);
    CHECK(rarity->less_than == 2.0);
    CHECK(rarity_of(with_one_year(), 1.0, 20.0)->years == 1.0);
    CHECK(rarity_of(with_one_year(), 1.0, 19.0)->less_than == 1.0);
}

TEST_CASE("a depth that columns share has the longest of their return periods") {
    const RainfallStatistics table{{1.0}, {2.0, 5.0, 10.0}, {30.0, 30.0, 40.0}, {}};
    CHECK(rarity_of(table, 1.0, 30.0)->years == 5.0);
}

TEST_CASE("there is no rarity outside the durations, without return periods, or of no depth") {
    const RainfallStatistics table = read_table(kCountyTable);
    CHECK_FALSE(rarity_of(table, 2.0 / 60.0, 10.0).has_value());
    CHECK_FALSE(rarity_of(table, 48.0, 100.0).has_value());
    CHECK_FALSE(rarity_of(single_list(), 1.0, 20.0).has_value());
    CHECK_FALSE(rarity_of(table, 1.0, -1.0).has_value());
    CHECK_FALSE(rarity_of(table, 1.0, std::numeric_limits<double>::quiet_NaN()).has_value());
    CHECK_FALSE(rarity_of(table, 1.0, std::numeric_limits<double>::infinity()).has_value());
}

TEST_CASE("rarity is the way back from depths, in random tables") {
    constexpr unsigned kSeed = 20261201;
    std::mt19937 random(kSeed);
    std::uniform_real_distribution<double> share(0.0, 1.0);
    int found = 0;
    for (int trial = 0; trial < 2000; ++trial) {
        const RainfallStatistics table = random_table(random);
        CAPTURE(kSeed, trial);
        const double first = table.return_period_yr.front();
        const double last = table.return_period_yr.back();
        const double years = first + share(random) * (last - first);
        const double hours = table.duration_h.front() +
                             share(random) * (table.duration_h.back() - table.duration_h.front());
        const ListAnswer list = depths_of(table, years);
        REQUIRE(list.list.has_value());
        const DepthAnswer depth = depth_of(*list.list, hours);
        REQUIRE(depth.depth_mm.has_value());
        const auto rarity = rarity_of(table, hours, *depth.depth_mm);
        REQUIRE(rarity.has_value());
        REQUIRE(rarity->years.has_value());
        // Where columns are equal the longest period is given; its depth is the same.
        const ListAnswer again = depths_of(table, *rarity->years);
        REQUIRE(again.list.has_value());
        CHECK_THAT(*depth_of(*again.list, hours).depth_mm, WithinRel(*depth.depth_mm, kRounding));
        CHECK(*rarity->years >= years * (1.0 - 1e-9));
        if (std::fabs(*rarity->years / years - 1.0) < 1e-9) ++found;
    }
    CHECK(found > 1000);
}

TEST_CASE("depths do not fall with duration or return period, in random tables") {
    constexpr unsigned kSeed = 20261202;
    std::mt19937 random(kSeed);
    for (int trial = 0; trial < 200; ++trial) {
        const RainfallStatistics table = random_table(random);
        CAPTURE(kSeed, trial);
        const double last = table.return_period_yr.back();
        std::vector<double> before(table.duration_h.size(), 0.0);
        for (double years = table.return_period_yr.front(); years <= last; years *= 1.07) {
            const ListAnswer answer = depths_of(table, years);
            REQUIRE(answer.list.has_value());
            const auto& depths = answer.list->depth_mm;
            CHECK(std::is_sorted(depths.begin(), depths.end()));
            for (std::size_t i = 0; i < depths.size(); ++i)
                CHECK(depths[i] >= before[i] * (1.0 - 1e-15));
            before = depths;
        }
    }
}

}  // namespace rainledger
