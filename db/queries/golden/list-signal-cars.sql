select `f`.`job_ref` as `jobRef`, `f`.`make` as `make`, `f`.`model` as `model`, `f`.`first_registered` as `firstRegistered`, `f`.`completed_on` as `completedOn`, listed.value ->> 'why' as `why`
from (select * from signals where branch_id in (select value from json_each(?))) as `s`
cross join json_each(s.job_refs) as listed
inner join (select * from jobs where branch_id in (select value from json_each(?))) as `j` on `j`.`branch_id` = `s`.`branch_id` and `j`.`job_ref` = listed.value ->> 'ref'
inner join (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `f` on `f`.`job_id` = `j`.`id`
where `s`.`id` = ?
order by listed.key;
