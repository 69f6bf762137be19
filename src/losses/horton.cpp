#include "rainledger/losses/horton.hpp"
